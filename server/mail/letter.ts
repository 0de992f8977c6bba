import Handlebars from 'handlebars';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

export interface RenderedLetter {
  html: string;
  text: string;
}

/** The templates lie beside the server's folder, whether it runs from its sources or built. */
function templateFolder(): string {
  let folder = import.meta.dirname;
  while (!existsSync(path.join(folder, 'templates', 'layout.html'))) {
    const parent = path.dirname(folder);
    if (parent === folder) throw new Error('The folder of the letter templates was not found.');
    folder = parent;
  }
  return path.join(folder, 'templates');
}

/** Templates and partials of one kind; a name that the view lacks is an error, not a gap in the letter. */
function compileAll(ending: '.html' | '.txt'): Map<string, Handlebars.TemplateDelegate> {
  const handlebars = Handlebars.create();
  const folder = templateFolder();
  const compiled = new Map<string, Handlebars.TemplateDelegate>();
  for (const file of readdirSync(folder).filter((name) => name.endsWith(ending))) {
    const name = path.basename(file, ending);
    const source = readFileSync(path.join(folder, file), 'utf8');
    handlebars.registerPartial(name, source);
    compiled.set(name, handlebars.compile(source, { strict: true, noEscape: ending === '.txt' }));
  }
  return compiled;
}

let templates: Record<'html' | 'text', Map<string, Handlebars.TemplateDelegate>> | undefined;

/** Fills a template in both forms; in the HTML every value is escaped. */
export function renderLetter(template: string, view: object): RenderedLetter {
  templates ??= { html: compileAll('.html'), text: compileAll('.txt') };
  const html = templates.html.get(template);
  const text = templates.text.get(template);
  if (!html || !text) throw new Error(`There is no letter template ${template}.`);
  return { html: html(view), text: text(view) };
}
