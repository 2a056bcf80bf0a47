import { writeFileSync } from 'node:fs';
import path from 'node:path';
import { DRAWINGS } from './drawings';
import { PICTURES } from './pictures';

// Draws every sample anew: node --import tsx samples/make.ts
for (const [name, draw] of Object.entries(DRAWINGS))
  writeFileSync(path.join(import.meta.dirname, name), draw());
for (const [name, draw] of Object.entries(PICTURES))
  writeFileSync(path.join(import.meta.dirname, name), await draw());
