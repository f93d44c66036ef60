import { performance } from 'node:perf_hooks';

/** Told of how a build goes on. */
export interface Progress {
  /** A stage begins; `total` steps are to come where it is known. */
  stage(name: string, total?: number): void;
  step(): void;
  end(): void;
}

export const noProgress: Progress = { stage() {}, step() {}, end() {} };

/** The part of a terminal that progress writes to. */
export interface Terminal {
  write(text: string): unknown;
  readonly columns?: number;
}

/** One line that is written over and gone at the end. */
export function terminalProgress(terminal: Terminal): Progress {
  let name = '';
  let total: number | undefined;
  let count = 0;
  let shown = 0;
  const show = () => {
    const text = total === undefined ? name : `${name} ${count}/${total}`;
    terminal.write(`\r\u001b[K${text.slice(0, (terminal.columns || 80) - 1)}`);
    shown = performance.now();
  };
  return {
    stage(newName, newTotal) {
      [name, total, count] = [newName, newTotal, 0];
      show();
    },
    step() {
      count += 1;
      // Twenty times a second is all that an eye follows.
      if (performance.now() - shown > 50 || count === total) show();
    },
    end() {
      terminal.write('\r\u001b[K');
    },
  };
}
