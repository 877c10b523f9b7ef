/** Four small exports that share works, one in each format a librarian brings. All of it is invented. */
export interface MadeFile {
  name: string;
  mimeType: string;
  buffer: Buffer;
}

const topics = ['sediment transport', 'reed bed filtration', 'tidal marsh accretion'];

/** `stamp` makes titles and identifiers of one run unlike those of any other. */
export function makeFiles(stamp: string): MadeFile[] {
  const doi = (index: number) => `10.5555/e2e.${stamp}.${index}`;
  const title = (index: number) => `Observed ${topics[index % 3]} in the ${stamp} basin, part ${index}`;
  const cited = (index: number) => `BRENNAN T, ${1990 + index}, J LOWLAND STUD, V${10 + index}, P${100 + index}, DOI ${doi(index)}`;
  const tagged = Array.from({ length: 12 }, (_, at) => {
    const index = at + 8;
    const references = Array.from({ length: 6 }, (_, place) => cited((at + place) % 8)).concat([`OUTSIDE W, 1980, J OLD WATERS, V3, P${20 + (at % 3)}`]);
    return ['PT J', 'AU Brennan, T', '   Achterberg, M', `TI ${title(index)}`, 'SO Journal of Lowland Studies', `DE ${topics[index % 3]}; lowland`, ...references.map((line, place) => `${place === 0 ? 'CR' : '  '} ${line}`), `NR ${references.length}`, `PY ${1998 + index}`, `VL ${10 + index}`, `BP ${100 + index}`, `DI ${doi(index)}`, 'ER', ''].join('\n');
  });
  const bibtex = Array.from({ length: 8 }, (_, index) => `@article{e2e${stamp}${index},\n  author = {Brennan, Tove and M{\\"u}ller, Ida},\n  title = {${title(index)}},\n  journal = {Journal of Lowland Studies},\n  year = {${1990 + index}},\n  volume = {${10 + index}},\n  pages = {${100 + index}--${110 + index}},\n  doi = {${doi(index)}}\n}\n`);
  const ris = [7, 8, 9].map((index) => `TY  - JOUR\nAU  - Brennan, Tove\nTI  - ${title(index)}\nJO  - Journal of Lowland Studies\nPY  - ${index < 8 ? 1990 + index : 1998 + index}\nVL  - ${10 + index}\nSP  - ${100 + index}\nDO  - ${doi(index)}\nER  - \n`);
  const json = [0, 30, 31].map((index) => ({ id: doi(index), type: 'article-journal', title: title(index), author: [{ family: 'Brennan', given: 'Tove' }], issued: { 'date-parts': [[index === 0 ? 1990 : 2016]] }, 'container-title': 'Journal of Lowland Studies', DOI: doi(index) }));
  return [
    { name: `${stamp}.bib`, mimeType: 'text/plain', buffer: Buffer.from(`${bibtex.join('\n')}\n@article{broken${stamp},\n  title = {Never closed\n`) },
    { name: `${stamp}.txt`, mimeType: 'text/plain', buffer: Buffer.from(`FN Export\nVR 1.0\n${tagged.join('\n')}\nEF\n`) },
    { name: `${stamp}.ris`, mimeType: 'text/plain', buffer: Buffer.from(ris.join('\n')) },
    { name: `${stamp}.json`, mimeType: 'application/json', buffer: Buffer.from(JSON.stringify(json, null, 1)) },
  ];
}
