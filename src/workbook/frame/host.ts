import type { WorkbookPort } from "../port";
import { pack, unpack } from "./cells";
import { HELLO, isMethod, WELCOME, type Answer, type Call, type Told } from "./messages";

/** The bench's end: gives the pane's frame, and no other, a message port that reaches the workbook. Returns a way to stop. */
export function servePort(frame: HTMLIFrameElement, book: WorkbookPort): () => void {
  let stopEvents: (() => void)[] = [];
  const greet = (event: MessageEvent): void => {
    if (event.source !== frame.contentWindow || event.origin !== location.origin || event.data !== HELLO) return;
    // a pane that was reloaded starts afresh
    stopEvents.forEach((stop) => stop());
    const { port1: ours, port2: theirs } = new MessageChannel();
    ours.onmessage = async ({ data }: MessageEvent<Call>) => ours.postMessage(await answer(book, data));
    stopEvents = (["selection", "change"] as const).map((name) => book.on(name, (area) => ours.postMessage({ event: name, area } satisfies Told)));
    stopEvents.push(() => ours.close());
    frame.contentWindow!.postMessage(WELCOME, location.origin, [theirs]);
  };
  addEventListener("message", greet);
  return () => {
    removeEventListener("message", greet);
    stopEvents.forEach((stop) => stop());
  };
}

async function answer(book: WorkbookPort, { call, method, args }: Call): Promise<Answer> {
  if (!isMethod(method)) return { call, failed: `the workbook has no ${String(method)}` };
  try {
    const run = book[method] as (...given: unknown[]) => Promise<unknown>;
    return { call, value: pack(await run.apply(book, args.map(unpack))) };
  } catch (error) {
    return { call, failed: error instanceof Error ? error.message : String(error) };
  }
}
