type Child = Node | string | null | undefined | false;
type Attributes = Readonly<Record<string, string | number | boolean | null | undefined | ((event: Event) => void)>>;

/** Builds an element: `on…` functions listen, `true` sets a bare attribute, null, undefined and false leave it away. */
export function h<Tag extends keyof HTMLElementTagNameMap>(tag: Tag, attributes: Attributes = {}, ...children: readonly Child[]): HTMLElementTagNameMap[Tag] {
  const element = document.createElement(tag);
  for (const [name, value] of Object.entries(attributes)) {
    if (value === null || value === undefined || value === false) continue;
    if (typeof value === "function") element.addEventListener(name.slice(2), value);
    else element.setAttribute(name, value === true ? "" : String(value));
  }
  element.append(...children.filter((child): child is Node | string => child !== null && child !== undefined && child !== false));
  return element;
}

/** Puts new children in a region and gives the focus back to the element of the same id, caret and all. */
export function refill(region: HTMLElement, ...children: readonly Child[]): void {
  const active = document.activeElement;
  const id = active instanceof HTMLElement && region.contains(active) ? active.id : "";
  const caret = active instanceof HTMLInputElement && active.type === "text" ? active.selectionStart : null;
  const open = new Set([...region.querySelectorAll("details[open][id]")].map((details) => details.id));
  region.replaceChildren(...children.filter((child): child is Node | string => child !== null && child !== undefined && child !== false));
  for (const details of region.querySelectorAll("details[id]")) if (open.has(details.id)) details.setAttribute("open", "");
  if (id === "") return;
  const again = document.getElementById(id);
  again?.focus({ preventScroll: true });
  if (again instanceof HTMLInputElement && caret !== null) again.setSelectionRange(caret, caret);
}
