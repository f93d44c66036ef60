import { type Colours, theme } from '../../chart/theme.js';
import { readTemplate } from './templates.js';

/** The style sheet: colours from the one palette as custom properties, then the rules of templates/style.css. */
export function styleSheet(): string {
  const figure = `  --figure-paper: ${theme.figure.paper};\n`;
  return [
    `:root {\n${properties(theme.light)}${figure}}\n`,
    `@media screen and (prefers-color-scheme: dark) {\n:root {\n${properties(theme.dark)}}\n}\n`,
    readTemplate('style.css'),
    '',
  ].join('\n');
}

/** Class of a status: its words joined by hyphens. */
export const statusClass = (status: string): string => `status-${status.replaceAll(' ', '-')}`;

function properties(colours: Colours): string {
  const { status, ...plain } = colours;
  const lines = Object.entries(plain).map(([name, value]) => `  --${name}: ${value};\n`);
  for (const [name, value] of Object.entries(status)) lines.push(`  --${statusClass(name)}: ${value};\n`);
  return lines.join('');
}
