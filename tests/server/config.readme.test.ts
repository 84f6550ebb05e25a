import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { settingsTable } from '../../server/config';

const readme = readFileSync('README.md', 'utf8');

describe('README', () => {
  it.each(settingsTable.map((setting) => [setting.name, setting] as const))('lists %s with its default and meaning', (name, setting) => {
    expect(readme).toContain(`| \`${name}\` | ${setting.default} | ${setting.meaning} |`);
  });

  it('lists no setting that does not exist', () => {
    const listed = [...readme.matchAll(/^\| `([A-Z][A-Z0-9_]+)` \|/gm)].map((row) => row[1]);
    expect(listed).toEqual(settingsTable.map(({ name }) => name));
  });
});
