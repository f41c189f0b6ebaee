/** Standard output belongs to a command's result; what is going on is told on standard error. */
export function say(line: string): void {
  process.stderr.write(`${line}\n`);
}
