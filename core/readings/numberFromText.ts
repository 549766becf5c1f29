const NUMBER = /^[+\-−]?(?:\d+\.?\d*|\.\d+)(?:[eE][+\-−]?\d+)?$/;

/** A number written with a decimal point, such as `12`, `.5` or `1e-3`; NaN for any other text. */
export function numberFromText(text: string): number {
  const trimmed = text.trim();
  if (trimmed.length > 400 || !NUMBER.test(trimmed)) return Number.NaN;
  const value = Number(trimmed.replaceAll('−', '-'));
  return Number.isFinite(value) ? value : Number.NaN;
}
