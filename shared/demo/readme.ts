import { areas, site, valves } from './demo-plant.js';

const forms: Readonly<Record<string, string>> = {
  'washing-wide.csv.gz': 'wide, comma, UTC, every two minutes, gzip',
  'extraction-long.csv.gz': 'long with a quality column, by exception at ten seconds, gzip',
  'precipitation-local-time.csv': 'wide, semicolon, decimal comma, local time, every three minutes',
  'utilities-long.csv.gz': 'long with a quality column, by exception at one minute, gzip',
};

/** The page beside the trends: what the plant is, how its files are read, and what each valve shows. */
export function readme(files: readonly string[]): string {
  const rows = valves.map(({ tag, service, shows }) => `| ${tag} | ${service} | ${shows} |`);
  return `# Sample trends

The trends of ${site.name}, an invented plant that makes alginate from kelp, in ${areas.length} areas with ${valves.length} control valves. Nothing here was measured: closed loops were simulated (\`shared/src/simulation\`) and kept as a historian would keep them. \`npm run sample-trends -w shared\` writes this folder anew, to the same bytes.

| file | form |
| --- | --- |
${files.map((file) => `| ${file} | ${forms[file] ?? ''} |`).join('\n')}

\`plant.json\` holds site, areas and files; \`valves.json\` the register. \`make run\` brings both in on first start, through the same reader and the same analysis as any other trend. Two valves stand in files of their own for the command line:

\`\`\`
npm run --silent assess -- --trends sample-trends/washing-wide.csv.gz --valve sample-trends/FV-1105.valve.json
npm run --silent assess -- --trends sample-trends/extraction-long.csv.gz --valve sample-trends/FV-2201.valve.json
\`\`\`

## What each valve shows

| valve | service | what is so |
| --- | --- | --- |
${rows.join('\n')}

All figures are those of the simulation, given so that anybody can hold the analysis against them. Work on a real valve is never decided on such evidence alone.
`;
}
