/** Longest text that a spreadsheet takes between quotation marks in a formula. */
const LONGEST_TEXT = 255;

/** A number as a formula takes it: all its digits, simple fractions as such; negative ones begin with `-`. */
export function numberLiteral(value: number): string {
  const sign = value < 0 ? '-' : '';
  const size = Math.abs(value);
  const text = String(size);
  if (text.length > 12) {
    // Spreadsheets keep 15 digits of what is typed: a fraction keeps them all.
    for (let below = 3; below <= 64; below++) {
      const above = Math.round(size * below);
      if (above > 0 && above < 1000 && above / below === size) return `${sign}${above}/${below}`;
    }
  }
  return `${sign}${text.replace('e', 'E').replace('E+', 'E')}`;
}

/** Text as a formula takes it, between quotation marks; longer text is joined from pieces. */
export function textLiteral(text: string): string {
  const pieces: string[] = [];
  for (let rest = text; rest !== '' || pieces.length === 0; ) {
    pieces.push(rest.slice(0, LONGEST_TEXT));
    rest = rest.slice(LONGEST_TEXT);
  }
  return pieces.map((piece) => `"${piece.replaceAll('"', '""')}"`).join('&');
}
