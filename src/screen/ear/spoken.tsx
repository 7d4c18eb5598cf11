import { Box, Static, Text } from 'ink';
import { type ReactElement, useRef } from 'react';
import type { State } from '../state.ts';
import { saidAfter, typedLine } from './said.ts';

interface SpokenProps {
  readonly state: State;
  /** Counts how often everything was asked to be said again. */
  readonly again: number;
}

/** The explorer for a screen reader: each sentence a line that stays, and below them what is being typed. */
export function Spoken({ state, again }: SpokenProps): ReactElement {
  const heard = useRef<{ state: State | null; again: number; lines: readonly string[] }>({
    state: null,
    again,
    lines: [],
  });
  const before = heard.current.again === again ? heard.current.state : null;
  const said = saidAfter(before, state);
  if (said.length > 0 || before !== state) {
    heard.current = { state, again, lines: [...heard.current.lines, ...said] };
  }
  return (
    <Box flexDirection="column">
      <Static items={[...heard.current.lines]}>{(line, at) => <Text key={at}>{line}</Text>}</Static>
      <Text>{typedLine(state)}</Text>
    </Box>
  );
}
