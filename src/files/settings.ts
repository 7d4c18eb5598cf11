import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import envPaths from 'env-paths';
import * as z from 'zod/mini';
import { harmless, quoted } from '../quantity/index.ts';
import { codeOf } from './write-whole.ts';

/** What somebody wants of every session; each may be left out, and none is ever needed. */
export interface Settings {
  /** The ground that the terminal has. */
  readonly theme?: 'dark' | 'light' | undefined;
  readonly glyphs?: 'unicode' | 'ascii' | undefined;
  /** Of a beam that is begun without a file. */
  readonly units?: 'us' | 'si' | undefined;
  /** Sentences for a screen reader in place of the screen. */
  readonly screenReader?: boolean | undefined;
}

const CHOICES = { theme: ['dark', 'light'], glyphs: ['unicode', 'ascii'], units: ['us', 'si'] } as const;
const SHAPE = z.strictObject({
  theme: z.optional(z.enum(CHOICES.theme)),
  glyphs: z.optional(z.enum(CHOICES.glyphs)),
  units: z.optional(z.enum(CHOICES.units)),
  screenReader: z.optional(z.boolean()),
});
const KEYS = Object.keys(SHAPE.shape);

/**
 * The settings that the platform keeps for this user: in ~/.config/thrice/settings.json or where XDG_CONFIG_HOME says,
 * and where other systems have such files. What cannot be read is told in a line.
 */
export function readSettings(): { settings: Settings; fault: string | null } {
  const file = join(envPaths('thrice', { suffix: '' }).config, 'settings.json');
  try {
    return settingsOf(readFileSync(file, 'utf8'), file);
  } catch (error) {
    return ['ENOENT', 'ENOTDIR'].includes(codeOf(error) ?? '')
      ? settingsOf(null, file)
      : { settings: {}, fault: refusal(file, `it could not be read (${codeOf(error)})`) };
  }
}

function refusal(file: string, why: string): string {
  return `settings not taken: ${why} (${harmless(file)})`;
}

/**
 * The settings of a file's text; null where there is no file. What is wrong with it is told in a line and costs the
 * settings, never the session.
 */
export function settingsOf(text: string | null, file: string): { settings: Settings; fault: string | null } {
  if (text === null) return { settings: {}, fault: null };
  const refused = (what: string) => ({ settings: {}, fault: refusal(file, what) });
  let document: unknown;
  try {
    document = JSON.parse(text);
  } catch {
    return refused('it is not JSON');
  }
  const parsed = SHAPE.safeParse(document);
  return parsed.success ? { settings: parsed.data, fault: null } : refused(faultOf(document));
}

function faultOf(document: unknown): string {
  if (typeof document !== 'object' || document === null || Array.isArray(document))
    return 'it is not an object';
  for (const [key, value] of Object.entries(document)) {
    if (!KEYS.includes(key)) return `there is no setting ${quoted(key)}; there are ${KEYS.join(', ')}`;
    if (SHAPE.shape[key as keyof Settings].safeParse(value).success) continue;
    const choices = Object.hasOwn(CHOICES, key)
      ? CHOICES[key as keyof typeof CHOICES].join(' or ')
      : 'true or false';
    return `${key} is ${choices}, not ${quoted(typeof value === 'string' ? value : JSON.stringify(value))}`;
  }
  return 'it is not read';
}

/** The environment with the settings in the places of the variables that are not set: these win. */
export function withSettings(
  env: Readonly<Record<string, string | undefined>>,
  { theme, glyphs, screenReader }: Settings,
): Record<string, string | undefined> {
  return {
    ...(theme === undefined ? {} : { THRICE_THEME: theme }),
    ...(glyphs === undefined ? {} : { THRICE_GLYPHS: glyphs }),
    ...(screenReader === undefined ? {} : { INK_SCREEN_READER: String(screenReader) }),
    ...env,
  };
}
