import type { Area, PortEvent, WorkbookPort } from "../port";
import { pack, unpack } from "./cells";
import { HELLO, methods, WELCOME, type Answer, type Call, type Told } from "./messages";

/** The pane's end: asks the page around it for its message port, and speaks the workbook port over it. */
export function connect(): WorkbookPort {
  const waiting = new Map<number, { resolve(value: unknown): void; reject(error: Error): void }>();
  const heard = new Map<PortEvent, Set<(area: Area) => void>>([["selection", new Set()], ["change", new Set()]]);
  let calls = 0;

  const receive = ({ data }: MessageEvent<Answer | Told>): void => {
    if ("event" in data) {
      heard.get(data.event)?.forEach((hear) => hear(data.area as Area));
      return;
    }
    const asked = waiting.get(data.call);
    waiting.delete(data.call);
    if ("failed" in data) asked?.reject(new Error(data.failed)); else asked?.resolve(unpack(data.value));
  };

  const channel = new Promise<MessagePort>((resolve) => {
    const welcome = (event: MessageEvent): void => {
      if (event.source !== parent || event.origin !== location.origin || event.data !== WELCOME) return;
      removeEventListener("message", welcome);
      const port = event.ports[0]!;
      port.onmessage = receive;
      resolve(port);
    };
    addEventListener("message", welcome);
    parent.postMessage(HELLO, location.origin);
  });

  const ask = (method: string) => async (...args: unknown[]): Promise<unknown> => {
    const port = await channel, call = calls++;
    return new Promise((resolve, reject) => {
      waiting.set(call, { resolve, reject });
      port.postMessage({ call, method, args: args.map(pack) } satisfies Call);
    });
  };
  const remote = Object.fromEntries(methods.map((method) => [method, ask(method)])) as unknown as Omit<WorkbookPort, "on">;
  return {
    ...remote,
    on(event, hear) {
      heard.get(event)!.add(hear);
      return () => { heard.get(event)!.delete(hear); };
    },
  };
}
