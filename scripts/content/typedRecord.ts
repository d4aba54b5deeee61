// A complex record as it was typed, in the shape that the engine's record writer takes.

import type { TypedComplex } from '#engine';
import { plainValue } from './node.ts';
import { readYaml } from './yaml/read.ts';

/** The typed texts of a complex record's file, or null where YAML cannot read it. Expects a record that the checks have passed. */
export function typedComplex(text: string): TypedComplex | null {
  const { root, faults } = readYaml(text);
  return root === null || faults.length > 0 ? null : (plainValue(root) as TypedComplex);
}
