import type { SpawnOptions } from 'node:child_process';

export function runNode(args: readonly string[], options?: SpawnOptions): Promise<void>;
export function runProgram(program: string, args: readonly string[], options?: SpawnOptions): Promise<void>;
