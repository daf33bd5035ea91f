/** What a phone loads first for Daybreak: the entry of the built client, its static imports and its style sheet, gzipped. */
import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import type { BenchLine } from './line.ts';

interface Chunk {
  file: string;
  isEntry?: boolean;
  imports?: string[];
  css?: string[];
}

const kilobytes = (folder: string, files: Iterable<string>): number => [...files].reduce((sum, file) => sum + gzipSync(readFileSync(join(folder, file)), { level: 9 }).length / 1000, 0);

/** Builds the client anew into a temporary folder and weighs it. */
export async function run(): Promise<BenchLine[]> {
  const folder = mkdtempSync(join(tmpdir(), 'dawnvane-web-'));
  try {
    execFileSync(process.execPath, ['node_modules/vite/bin/vite.js', 'build', '--outDir', folder, '--emptyOutDir', '--manifest', 'manifest.vite.json', '--logLevel', 'error']);
    const manifest = JSON.parse(readFileSync(join(folder, 'manifest.vite.json'), 'utf8')) as Record<string, Chunk>;
    const scripts = new Set<string>();
    const styles = new Set<string>();
    const walk = (name: string): void => {
      const chunk = manifest[name];
      if (!chunk || scripts.has(chunk.file)) return;
      scripts.add(chunk.file);
      chunk.css?.forEach((file) => styles.add(file));
      chunk.imports?.forEach(walk);
    };
    walk('index.html');
    const weight = kilobytes(folder, scripts);
    return [
      { name: 'first-load JavaScript of Daybreak', value: weight, unit: 'kB gzip', baseline: { name: 'React, router and query alone', value: 89 }, ratio: weight / 89, goal: '≤ 140 kB', met: weight <= 140 },
      { name: 'first-load style sheet', value: kilobytes(folder, styles), unit: 'kB gzip' },
    ];
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
