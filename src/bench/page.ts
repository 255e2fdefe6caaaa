/** The elements of the bench's page, and small pieces of behaviour that know nothing of a workbook. */
export const element = <E extends HTMLElement = HTMLElement>(id: string): E => {
  const found = document.getElementById(id);
  if (!found) throw new Error(`the page has no #${id}`);
  return found as E;
};

/** A line under the header: what went wrong, or what was done. */
export function notice(says: string, tone: "trouble" | "plain" = "trouble"): void {
  const line = element("notice");
  element("notice-text").textContent = says;
  line.classList.toggle("plain", tone === "plain");
  line.hidden = false;
}

export function closeNotice(): void {
  element("notice").hidden = true;
}

const NARROWEST = 320, STEP = 24;

/** The pane's width by dragging or by arrow keys, kept for the next visit. */
export function splitter(): void {
  const bar = element("splitter"), root = document.documentElement;
  const width = (): number => element("pane").getBoundingClientRect().width;
  const set = (wanted: number): void => {
    const most = Math.max(NARROWEST, innerWidth - 360), px = Math.round(Math.min(most, Math.max(NARROWEST, wanted)));
    root.style.setProperty("--pane-width", `${px}px`);
    bar.setAttribute("aria-valuenow", String(px));
    bar.setAttribute("aria-valuemin", String(NARROWEST));
    bar.setAttribute("aria-valuemax", String(most));
  };
  bar.addEventListener("pointerdown", (event) => {
    bar.setPointerCapture(event.pointerId);
    document.body.classList.add("resizing");
  });
  bar.addEventListener("pointermove", (event) => {
    if (bar.hasPointerCapture(event.pointerId)) set(innerWidth - event.clientX);
  });
  bar.addEventListener("lostpointercapture", () => document.body.classList.remove("resizing"));
  bar.addEventListener("keydown", ({ key }) => {
    if (key === "ArrowLeft") set(width() + STEP);
    if (key === "ArrowRight") set(width() - STEP);
  });
  set(width() || 380);

  const toggle = element<HTMLButtonElement>("toggle-pane");
  toggle.addEventListener("click", () => {
    const hidden = element("bench").classList.toggle("no-pane");
    toggle.setAttribute("aria-expanded", String(!hidden));
    dispatchEvent(new Event("resize"));
  });
}

/** Files dropped anywhere on a window: the page's own, and the pane's, which else would open them in its frame. */
export function onDrop(target: Window, take: (file: File) => void): void {
  let depth = 0;
  const carriesFiles = (event: DragEvent): boolean => [...event.dataTransfer?.types ?? []].includes("Files");
  const show = (on: boolean): void => { element("drop").hidden = !on; };
  target.addEventListener("dragenter", (event) => {
    if (!carriesFiles(event)) return;
    depth++;
    show(true);
  });
  target.addEventListener("dragleave", (event) => {
    if (carriesFiles(event) && --depth <= 0) { depth = 0; show(false); }
  });
  target.addEventListener("dragover", (event) => { if (carriesFiles(event)) event.preventDefault(); });
  target.addEventListener("drop", (event) => {
    if (!carriesFiles(event)) return;
    event.preventDefault();
    depth = 0;
    show(false);
    const file = event.dataTransfer!.files[0];
    if (file) take(file);
  });
}

/** Hands the user a file. */
export function download(name: string, bytes: Uint8Array): void {
  const url = URL.createObjectURL(new Blob([bytes as Uint8Array<ArrayBuffer>], { type: "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet" }));
  const link = document.createElement("a");
  link.href = url;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(url), 10_000);
}

/** Loads a script of our own as the office host would: a tag in the page. */
export const loadScript = (source: string): Promise<void> => new Promise((resolve, reject) => {
  const script = document.createElement("script");
  script.src = source;
  script.onload = () => resolve();
  script.onerror = () => reject(new Error(`${source} could not be loaded`));
  document.head.append(script);
});
