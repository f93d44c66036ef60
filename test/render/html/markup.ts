/** Looking at pages as text: attributes of ours are quoted and escaped, so that a tag ends at its first `>`. */
const tag = /<(\/?[A-Za-z][A-Za-z0-9]*|!DOCTYPE)([^<>]*)>/g;

export interface Tag {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
}

export function tagsOf(html: string): Tag[] {
  return [...html.matchAll(tag)].map(([, name, rest]) => ({
    name,
    attributes: Object.fromEntries(
      [...rest.matchAll(/([A-Za-z][A-Za-z0-9:-]*)(?:="([^"]*)")?/g)].map((match) => [match[1], match[2] ?? '']),
    ),
  }));
}

/** Tags with the names of their attributes, pictures left out. */
export const skeleton = (html: string) =>
  tagsOf(html.replace(/<svg[\s\S]*?<\/svg>/g, '<svg></svg>')).map(
    ({ name, attributes }) => `${name} ${Object.keys(attributes).join(' ')}`,
  );

export const idsOf = (html: string) => tagsOf(html).flatMap(({ attributes }) => attributes.id ?? []);
