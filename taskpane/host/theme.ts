/** Wears the host's theme; where the host does not say, the system's own preference holds. */
export function wearTheme(root: HTMLElement): void {
  // Some hosts leave the theme out although its type says otherwise.
  const theme = Office.context.officeTheme as Office.OfficeTheme | undefined;
  const background = theme?.bodyBackgroundColor;
  if (background === undefined || !/^#?[0-9a-f]{6}$/i.test(background)) return;
  root.dataset['theme'] = luminance(background) < 0.35 ? 'dark' : 'light';
}

/** Roughly how bright a colour `#rrggbb` is, 0 to 1. */
function luminance(colour: string): number {
  const digits = colour.replace('#', '');
  const part = (at: number): number => Number.parseInt(digits.slice(at, at + 2), 16) / 255;
  return 0.2126 * part(0) + 0.7152 * part(2) + 0.0722 * part(4);
}
