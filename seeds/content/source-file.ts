import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { LineCounter, isNode, parseDocument, type Document } from 'yaml';
import type { z } from 'zod';

type Place = readonly PropertyKey[];

/** A hand-written file: its YAML as a plain value, the Markdown after it, and a way to refuse it by name and line. */
export interface SourceFile {
  /** Path below the content folder. */
  name: string;
  value: unknown;
  body: string;
  /** Throws with the file's name, the line that `place` stands on, and what is wrong there. */
  refuse(place: Place, message: string): never;
}

/** Reads Markdown that opens with YAML between two `---` lines. */
export async function readMarkdown(dir: string, name: string): Promise<SourceFile> {
  const text = await readText(dir, name);
  const parts = /^---\n(?<yaml>[\s\S]*?)^---\n(?<body>[\s\S]*)$/m.exec(text)?.groups;
  if (!parts || !text.startsWith('---\n'))
    throw new Error(`${name}:1: it must open with front matter between two "---" lines.`);
  return toSourceFile({ name, yaml: parts['yaml'] ?? '', body: (parts['body'] ?? '').trim(), firstLine: 2 });
}

/** Reads a file that is YAML from its first line. */
export async function readYaml(dir: string, name: string): Promise<SourceFile> {
  return toSourceFile({ name, yaml: await readText(dir, name), body: '', firstLine: 1 });
}

/** The file's value as `schema` has it; every fault is told with its line. */
export function checkSource<T extends z.ZodType>(schema: T, source: SourceFile): z.output<T> {
  return checkValue(schema, source.value, source);
}

/** Checks a value made from a file, so that a fault names that file. */
export function checkValue<T extends z.ZodType>(schema: T, value: unknown, source: SourceFile): z.output<T> {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  const [first] = result.error.issues;
  if (!first) return source.refuse([], 'It does not fit.');
  const place = first.code === 'unrecognized_keys' ? [...first.path, ...first.keys.slice(0, 1)] : first.path;
  return source.refuse(place, first.message);
}

export async function readText(dir: string, name: string): Promise<string> {
  try {
    return (await readFile(join(dir, name), 'utf8')).replaceAll('\r\n', '\n');
  } catch (cause) {
    throw new Error(`${name}: it cannot be read.`, { cause });
  }
}

function toSourceFile(file: { name: string; yaml: string; body: string; firstLine: number }): SourceFile {
  const counter = new LineCounter();
  const document = parseDocument(file.yaml, { lineCounter: counter, prettyErrors: false });
  const lineAt = (offset: number) => counter.linePos(offset).line + file.firstLine - 1;

  const [fault] = document.errors;
  if (fault) throw new Error(`${file.name}:${lineAt(fault.pos[0])}: ${fault.message}`);
  return {
    name: file.name,
    value: document.toJS() as unknown,
    body: file.body,
    refuse(place, message) {
      const where = place.length > 0 ? ` ${place.map(String).join('.')}:` : '';
      throw new Error(`${file.name}:${lineAt(offsetOf(document, place))}:${where} ${message}`);
    },
  };
}

/** Where the nearest node that exists on the way to `place` begins. */
function offsetOf(document: Document, place: Place): number {
  for (let depth = place.length; depth > 0; depth -= 1) {
    const node: unknown = document.getIn(place.slice(0, depth), true);
    if (isNode(node) && node.range) return node.range[0];
  }
  return 0;
}
