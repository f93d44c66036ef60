import { readdirSync, readFileSync } from 'node:fs';
import Handlebars from 'handlebars';

/** `templates/` at the top of the package: three levels up both from `src/render/html/` and from `dist/render/html/`. */
const folder = new URL('../../../templates/', import.meta.url);

export function readTemplate(name: string): string {
  // The last line end belongs to the file, not to the page: partials stand inside lines of text.
  return readFileSync(new URL(name, folder), 'utf8').replace(/\r\n/g, '\n').replace(/\n$/, '');
}

export type TemplateName = 'page' | 'index' | 'supplier';

let compiled: Readonly<Record<TemplateName, Handlebars.TemplateDelegate>> | undefined;

/** Fills a template with a plain object; a field that the template names and the object lacks is an error. */
export function fillTemplate(name: TemplateName, view: object): string {
  compiled ??= load();
  return `${compiled[name](view)}\n`;
}

function load(): Readonly<Record<TemplateName, Handlebars.TemplateDelegate>> {
  const environment = Handlebars.create();
  const options = { strict: true, preventIndent: true } as const;
  for (const file of readdirSync(new URL('partials/', folder)).sort()) {
    if (!file.endsWith('.hbs')) continue;
    const source = readTemplate(`partials/${file}`);
    environment.registerPartial(file.slice(0, -'.hbs'.length), environment.compile(source, options));
  }
  return {
    page: environment.compile(readTemplate('page.hbs'), options),
    index: environment.compile(readTemplate('index.hbs'), options),
    supplier: environment.compile(readTemplate('supplier.hbs'), options),
  };
}
