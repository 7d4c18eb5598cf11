/** Controls, what reorders or hides text, and halves of characters: never to be printed. The line feed ends a line. */
export const UNSAFE =
  /[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u061c\u200b-\u200f\u2028-\u202e\u2060-\u2069\ufeff]|\p{Cs}/u;

/** Texts that a session file refuses wherever somebody may write freely, each by what it would do to a terminal. */
export const HARMFUL_TEXTS: Readonly<Record<string, string>> = {
  'an escape sequence that clears the screen': 'a\u001b[2Jb',
  'one that sets the title of the window': 'a\u001b]0;owned\u0007b',
  'one that writes to the clipboard': 'a\u001b]52;c;b3duZWQ=\u001b\\b',
  'a control sequence in one byte of C1': 'a\u009b31mb',
  'a line end': 'a\nb',
  'a carriage return': 'a\rb',
  'a bell and a backspace': 'a\u0007\u0008b',
  'a NUL': 'a\u0000b',
  'a text direction override': 'a\u202eb\u202c',
  'an isolate': 'a\u2066b\u2069',
  'a zero-width joiner': 'a\u200db',
  'a zero-width space': 'a\u200bb',
  'a line separator': 'a\u2028b',
  'a byte order mark': 'a\ufeffb',
  'an invisible tag': 'a\u{e0041}b',
  'half a character': 'a\ud800b',
  'a private character': 'a\ue000b',
};

/** Texts that are taken, and stand wherever they are shown without harm. */
export const ODD_TEXTS: readonly string[] = [
  '梁の桁 wide',
  '👷 wider',
  'Zalgo e\u0301\u0323\u0302\u0316\u0330',
  'עברית עם right to left',
  '__proto__',
  'constructor',
  'toString',
  '=1+1',
  '-1',
  '"quoted" \'twice\', ; and | all',
  '<script>alert(1)</script>',
  '\\u001b[31m spelled',
  '%s %n $(id) `id`',
  '../../etc/passwd',
];
