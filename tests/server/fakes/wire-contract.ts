import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import ts from 'typescript';

/** A JSON value as it came over the wire and the name of the published type it should have. */
export interface Claim {
  type: string;
  value: unknown;
}

export interface WireContract {
  /** What the compiler has against each claim; empty lists mean that the value is of its type. */
  check: (claims: Claim[]) => string[][];
  close: () => void;
}

/**
 * A copy of the SDK's published types that says what travels: `OtherString`, which lets any string pass
 * for an enum, becomes `never`, and `Decimal`, which the SDK makes of a string, becomes that string.
 */
function copyTypes(folder: string): void {
  const entry = createRequire(import.meta.url).resolve('stripe');
  cpSync(join(dirname(entry), '../esm'), join(folder, 'esm'), {
    recursive: true,
    filter: (source) => !/\.(js|map)$/.test(source),
  });
  writeFileSync(join(folder, 'package.json'), '{"type":"module"}');
  const shared = join(folder, 'esm/shared.d.ts');
  const text = readFileSync(shared, 'utf8');
  const strict = text
    .replace("export { Decimal } from './Decimal.js';", 'export type Decimal = string;')
    .replace(/export type OtherString = .*;/, 'export type OtherString = never;');
  if (!strict.includes('Decimal = string') || !strict.includes('OtherString = never')) {
    throw new Error('The published types are written otherwise than this check expects.');
  }
  writeFileSync(shared, strict);
}

/** Reads the published types of the installed SDK once and checks JSON against them with the TypeScript compiler. */
export function openWireContract(): WireContract {
  const folder = mkdtempSync(join(tmpdir(), 'stripe-types-'));
  copyTypes(folder);
  const file = join(folder, 'claims.ts');
  const options: ts.CompilerOptions = {
    strict: true,
    exactOptionalPropertyTypes: true,
    noEmit: true,
    skipLibCheck: true,
    module: ts.ModuleKind.NodeNext,
    moduleResolution: ts.ModuleResolutionKind.NodeNext,
    target: ts.ScriptTarget.ES2023,
    types: [],
  };
  const host = ts.createCompilerHost(options);
  let before: ts.Program | undefined;

  return {
    check(claims) {
      const lines = claims.map(({ type, value }, i) => `export const claim${i}: ${type} = ${JSON.stringify(value)};`);
      writeFileSync(file, ["import type { Stripe } from './esm/stripe.esm.node.js';", ...lines].join('\n'));
      const program = ts.createProgram([file], options, host, before);
      before = program;
      const source = program.getSourceFile(file);
      const findings: string[][] = claims.map(() => []);
      for (const finding of program.getSemanticDiagnostics(source)) {
        const line = source?.getLineAndCharacterOfPosition(finding.start ?? 0).line ?? 0;
        const place = claims[line - 1]?.type ?? 'import';
        (findings[line - 1] ?? findings[0])?.push(
          `${place}: ${ts.flattenDiagnosticMessageText(finding.messageText, ' ')}`,
        );
      }
      return findings;
    },
    close: () => rmSync(folder, { recursive: true }),
  };
}
