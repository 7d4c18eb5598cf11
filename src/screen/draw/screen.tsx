import { Box, Text, useCursor } from 'ink';
import TextInput from 'ink-text-input';
import { memo, type ReactElement } from 'react';
import type { Canvas } from './canvas.ts';
import { entryWindow } from './entry-window.ts';
import { rowText } from './rows.ts';
import type { Theme } from './theme.ts';

/** A field being typed into, laid over a stretch of one row. The state holds the edit; the field only shows it. */
export interface ScreenEntry {
  /** Row of the canvas. */
  readonly row: number;
  /** First column of the field. */
  readonly column: number;
  /** Cells of the field, 1 or more. */
  readonly width: number;
  /** The text as typed so far. */
  readonly value: string;
  /** Characters before the cursor. */
  readonly cursor: number;
}

interface RowProps {
  /** The row with its styles, no wider than the screen; never empty, as an empty Text has no height. */
  readonly text: string;
}

/** One row of the screen. Drawn anew only when its text changes. */
const Row = memo(function Row({ text }: RowProps): ReactElement {
  return <Text wrap="truncate">{text}</Text>;
});

interface EntryRowProps {
  /** The row left of the field. */
  readonly before: string;
  /** The row right of the field. */
  readonly after: string;
  /** What the field shows. */
  readonly shown: string;
  /** Cells of the field. */
  readonly width: number;
}

// ink-text-input edits from a stale copy when keys come in bursts, so it never has the focus here:
// it shows the state's text, and the terminal's own cursor shows where the state's cursor stands.
const ignore = (): void => {};

/** The row that holds the field. */
const EntryRow = memo(function EntryRow({ before, after, shown, width }: EntryRowProps): ReactElement {
  return (
    <Box height={1}>
      <Box flexShrink={0}>
        <Text wrap="truncate">{before}</Text>
      </Box>
      <Box width={width} flexShrink={0} height={1} overflow="hidden">
        <TextInput value={shown} focus={false} showCursor={false} onChange={ignore} />
      </Box>
      <Text wrap="truncate">{after}</Text>
    </Box>
  );
});

interface ScreenProps {
  /** The cells to show. */
  readonly canvas: Canvas;
  /** How styles look. */
  readonly theme: Theme;
  /** The field being typed into, if any. */
  readonly entry?: ScreenEntry | null;
}

/** A canvas on the terminal: one memoised Text a row, so that rows that stay as they were cost nothing. */
export function Screen({ canvas, theme, entry = null }: ScreenProps): ReactElement {
  const field = entry === null ? null : entryWindow(entry.value, entry.cursor, entry.width);
  const { setCursorPosition } = useCursor();
  setCursorPosition(
    entry === null || field === null ? undefined : { x: entry.column + field.cursor, y: entry.row },
  );

  const rows: ReactElement[] = [];
  for (let y = 0; y < canvas.rows; y += 1) {
    if (entry !== null && field !== null && y === entry.row) {
      rows.push(
        <EntryRow
          key={y}
          before={rowText(canvas, y, theme, 0, entry.column, false)}
          after={rowText(canvas, y, theme, entry.column + entry.width)}
          shown={field.shown}
          width={entry.width}
        />,
      );
    } else {
      rows.push(<Row key={y} text={rowText(canvas, y, theme) || ' '} />);
    }
  }
  return (
    <Box flexDirection="column" height={canvas.rows} width={canvas.columns}>
      {rows}
    </Box>
  );
}
