/**
 * Desktop hosts cut the value of a custom document property to 255 characters without a word, so a longer setting travels in
 * pieces: `name`, `name~2`, `name~3`. Source: the office host's reference of CustomPropertyCollection.add.
 */
export const LONGEST_PIECE = 255;
/** More than any setting of ours needs; a longer one is refused by who writes it. */
export const MOST_PIECES = 16;

export const pieceName = (name: string, piece: number): string => piece === 1 ? name : `${name}~${piece}`;

/** A text cut into pieces; never between the halves of one letter. */
export function inPieces(text: string): string[] {
  const pieces: string[] = [];
  let piece = "";
  for (const letter of text) {
    if (piece.length + letter.length > LONGEST_PIECE) { pieces.push(piece); piece = ""; }
    piece += letter;
  }
  return [...pieces, piece];
}

/** Settings by name, their pieces put together again. */
export function fromPieces(properties: ReadonlyMap<string, string>): Map<string, string> {
  const settings = new Map<string, string>();
  for (const [name, text] of properties) {
    if (/~\d+$/.test(name) && properties.has(name.replace(/~\d+$/, ""))) continue;
    let whole = text;
    for (let piece = 2; properties.has(pieceName(name, piece)); piece++) whole += properties.get(pieceName(name, piece))!;
    settings.set(name, whole);
  }
  return settings;
}
