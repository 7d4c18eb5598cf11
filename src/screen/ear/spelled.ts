/** Signs that a screen reader skips or names by their shape, with what they mean; in this order. */
const SPELLED: readonly (readonly [RegExp, string])[] = [
  [/(\d+)'-(\d+(?: \d+\/\d+)?)"/g, '$1 ft $2 in'],
  [/(\d)"/g, '$1 in'],
  [/(\d)'/g, '$1 ft'],
  [/\((\d+)\) (?=\d)/g, '$1 plies of '],
  [/\bl\/h\b/g, 'l over h'],
  [/\bl\/(\d)/g, 'l over $1'],
  [/\)²/g, ') squared'],
  [/\)³/g, ') cubed'],
  [/ft²/g, 'square ft'],
  [/m²/g, 'square m'],
  [/(?<=[a-z])[¹²³]/g, ''],
  [/[¹²³]/g, ''],
  [/−(?=\.?\d)/g, 'minus '],
  [/\+(?=\.?\d)/g, 'plus '],
  [/↑↓/g, 'up and down arrows'],
  [/←→/g, 'left and right arrows'],
  [/↑/g, 'up arrow'],
  [/↓/g, 'down arrow'],
  [/←/g, 'left arrow'],
  [/→/g, 'right arrow'],
  [/≤/g, 'at most '],
  [/≥/g, 'at least '],
  [/Δ/g, 'delta '],
  [/⊥/g, ' perpendicular'],
  [/[′]/g, ' prime'],
  [/\s+/g, ' '],
];

/** A text as a screen reader should say it: feet and inches, plies, signs and arrows in words. */
export function spelled(text: string): string {
  return SPELLED.reduce((said, [sign, words]) => said.replace(sign, words), text).trim();
}

/** A sentence: spelled, begun and ended as one. A letter that stands alone is a key or a symbol, and stays. */
export function sentence(text: string): string {
  const said = spelled(text).replace(/^\p{Ll}(?=\p{L})/u, (letter) => letter.toUpperCase());
  return said === '' || /[.!?:]$/.test(said) ? said : `${said}.`;
}
