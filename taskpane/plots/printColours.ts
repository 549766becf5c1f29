/** The palette's light colours, for a picture that is printed on white; a test compares them with the palette. */
export const printColours: Readonly<Record<string, string>> = {
  '--paper-raised': '#ffffff',
  '--ink-soft': '#4a626a',
  '--rule': '#d9d8d0',
  '--edge': '#7b8b8e',
  '--reading': '#2b6f7c',
  '--reading-aside': '#7b8b8e',
  '--signal': '#c26d1f',
};
