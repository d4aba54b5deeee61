/** A line of progress that overwrites itself; silent where the stream is no terminal. */
export interface Progress {
  readonly update: (done: number, of: number) => void;
  /** Clears the line. */
  readonly end: () => void;
}

interface Terminal {
  readonly isTTY?: boolean | undefined;
  readonly write: (text: string) => unknown;
}

/** Progress of a count, written to `stream` at most once for each hundredth part. */
export function progressLine(what: string, stream: Terminal): Progress {
  if (stream.isTTY !== true) return { update: () => undefined, end: () => undefined };
  let shown = -1;
  return {
    update: (done, of) => {
      const percent = of === 0 ? 100 : Math.floor((100 * done) / of);
      if (percent === shown) return;
      shown = percent;
      stream.write(`\r${what}: ${done} of ${of}`);
    },
    end: () => {
      if (shown >= 0) stream.write('\r\u001b[K');
    },
  };
}
