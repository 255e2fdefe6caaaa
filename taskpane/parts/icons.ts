/** Signs drawn as SVG, since not every font has them. They repeat what stands in words beside them. */
const SHAPES = {
  impossible: '<path d="M8 1.2 14.8 8 8 14.8 1.2 8z"/><path class="icon-ink" d="M8 4.6v4.2M8 11v.2"/>',
  doubtful: '<path d="M8 1.8 15 14H1z"/><path class="icon-ink" d="M8 6.4v3.6M8 12v.2"/>',
  ask: '<rect x="1.8" y="1.8" width="12.4" height="12.4" rx="2.5"/><path class="icon-ink" d="M6 6.2c.1-2.3 4-2.2 4 0 0 1.600-2 1.500-2 3.300M8 11.600v.2"/>',
  good: '<circle cx="8" cy="8" r="6.6"/><path class="icon-ink" d="M5 8.300 7.200 10.500 11.200 5.800"/>',
} as const;

export type IconName = keyof typeof SHAPES;

export function icon(name: IconName): SVGSVGElement {
  const svg = document.createElementNS("http://www.w3.org/2000/svg", "svg");
  svg.setAttribute("viewBox", "0 0 16 16");
  svg.setAttribute("class", `icon icon-${name}`);
  svg.setAttribute("aria-hidden", "true");
  svg.innerHTML = SHAPES[name];
  return svg;
}
