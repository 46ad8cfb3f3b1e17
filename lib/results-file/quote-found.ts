const SHOWN = 60;

/** Characters that cannot be seen or that turn the text around; shown by their code point. */
const INVISIBLE = /[\u0000-\u001f\u007f-\u00a0\u00ad\u200b-\u200f\u2028-\u202f\u2060-\u206f\ufeff]/g;

/** The text of a cell in quotation marks: one line, invisible characters made visible, long texts shortened. */
export function quoteFound(text: string): string {
  const shortened = text.length > SHOWN ? `${text.slice(0, SHOWN).replace(/[\ud800-\udbff]$/, '')}...` : text;
  return `"${shortened.replace(INVISIBLE, nameCharacter)}"`;
}

/** "U+00A0" in brackets. */
export function nameCharacter(character: string): string {
  const code = character.codePointAt(0) ?? 0;
  return `[U+${code.toString(16).toUpperCase().padStart(4, '0')}]`;
}
