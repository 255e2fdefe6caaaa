/** Puts a text on the clipboard; where the host's frame forbids it, by way of a selected field. */
export async function copyText(text: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(text);
    return true;
  } catch { /* the frame has no leave to use the clipboard: the older way may still work */ }
  const field = document.createElement("textarea");
  field.value = text;
  field.setAttribute("aria-hidden", "true");
  field.className = "off-screen";
  const active = document.activeElement;
  document.body.append(field);
  field.select();
  const copied = document.execCommand("copy");
  field.remove();
  if (active instanceof HTMLElement) active.focus({ preventScroll: true });
  return copied;
}
