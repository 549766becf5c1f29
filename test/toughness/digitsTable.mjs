/** Prints how many certified digits the graded sets are met to, as Markdown: node test/toughness/digitsTable.mjs */
import { loadTypeScript } from '../../manifest-template/loadTypeScript.mjs';

const { digitsReached, digitsTable } = await loadTypeScript('test/toughness/digitsTable.ts');
console.log(digitsTable(digitsReached()));
