import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const FOLDER = fileURLToPath(new URL('../../sessions/', import.meta.url));

interface Sample {
  readonly file: string;
  readonly title: string;
  readonly members: readonly string[];
}

/** The sample sessions that the project ships, as their files say. */
export const SAMPLES: readonly Sample[] = readdirSync(FOLDER)
  .filter((name) => name.endsWith('.json'))
  .map((name) => {
    const file = join(FOLDER, name);
    const { title, members } = JSON.parse(readFileSync(file, 'utf8')) as {
      title: string;
      members: { name: string }[];
    };
    return { file, title, members: members.map((member) => member.name) };
  });

/** The sample that tests with figures of their own stand on. */
export const BOATHOUSE: Sample = SAMPLES.find(({ title }) => title === 'Boathouse at Alder Cove')!;
