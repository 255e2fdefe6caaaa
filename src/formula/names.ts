/**
 * The variable names of a formula text, read by the compiler:
 * `Names<"a / (1 + b / 100)">` is `"a" | "b"`.
 */
type Separator = " " | "+" | "-" | "*" | "/" | "^" | "(" | ")" | ",";
type NumberStart = "0" | "1" | "2" | "3" | "4" | "5" | "6" | "7" | "8" | "9" | ".";

type Keep<Word extends string> = Word extends "" | "log10" | "exp" | `${NumberStart}${string}` ? never : Word;

type Scan<Text extends string, Word extends string, Found extends string> =
  Text extends `${infer Letter}${infer Rest}`
    ? Letter extends Separator ? Scan<Rest, "", Found | Keep<Word>> : Scan<Rest, `${Word}${Letter}`, Found>
    : Found | Keep<Word>;

export type Names<Text extends string> = Scan<Text, "", never>;
