/** What a change adds or spares: "+1.4", "−2.1", "0" where it is the same to the eye; empty where it is not known. */
export function signed(value: number | null, show: (size: number) => string): string {
  if (value === null) return '';
  const text = show(Math.abs(value));
  if (!/[1-9]/.test(text)) return '0';
  return `${value < 0 ? '−' : '+'}${text}`;
}
