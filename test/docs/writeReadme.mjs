/** Writes the README's generated tables anew: node test/docs/writeReadme.mjs */
import { readFileSync, writeFileSync } from 'node:fs';
import { loadTypeScript } from '../../manifest-template/loadTypeScript.mjs';

const { fillReadme } = await loadTypeScript('test/docs/readmeParts.ts');
writeFileSync('README.md', fillReadme(readFileSync('README.md', 'utf8')));
