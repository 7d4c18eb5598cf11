import { Box, render, Text, useApp, useInput } from 'ink';
import { type ReactElement, useState } from 'react';

/** As many short texts as a plain Ink program of the explorer's size would have. */
const TEXTS = 34;
const KEYS_SHOWN = 1000;

/** The least an Ink program can do that fills the screen and answers a key: what the explorer is held against. */
function Bare(): ReactElement {
  const [count, setCount] = useState(0);
  const { exit } = useApp();
  useInput((input, key) => {
    if (input === 'q') exit();
    if (key.rightArrow) setCount((before) => before + 1);
    if (key.leftArrow) setCount((before) => before - 1);
  });
  const { columns, rows } = process.stdout;
  return (
    <Box flexDirection="column" width={columns} height={rows}>
      {Array.from({ length: TEXTS }, (_, row) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: the rows never move
        <Text key={row} color={row % 3 === 0 ? 'cyan' : undefined}>
          row {row}: {(count * (row + 1)) % KEYS_SHOWN}
        </Text>
      ))}
    </Box>
  );
}

render(<Bare />, {
  alternateScreen: true,
  incrementalRendering: true,
  maxFps: 60,
  exitOnCtrlC: false,
  patchConsole: false,
  interactive: true,
});
