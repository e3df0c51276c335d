/** One line of JSON for each event. Never a body, a name, a title, an address or a token: those are the team's own. */
export type LogLine = Readonly<Record<string, string | number | boolean | null>>;

export interface Log {
  info: (event: string, fields?: LogLine) => void;
  error: (event: string, error: unknown, fields?: LogLine) => void;
  /** writes what is still held back */
  flush: () => void;
}

/** How a fault is told: kind, sentence and place in the code; for a database error neither the SQL nor its values. */
function faultFields(error: unknown): LogLine {
  if (!(error instanceof Error)) return { fault: typeof error };
  const code = (error as { parent?: { code?: unknown } }).parent?.code;
  const places = (error.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line)).slice(0, 6).map((line) => line.trim());
  return { fault: error.name, ...(typeof code === 'string' ? { code } : { message: error.message.slice(0, 300) }), stack: places.join(' | ') };
}

/**
 * A log that writes its lines together a few times a second: one write for each request would cost more than most answers.
 * @param write where the lines go, whole lines at a time
 */
export function createLog(write: (text: string) => void, now: () => Date): Log {
  let held: string[] = [];
  let timer: NodeJS.Timeout | null = null;
  const flush = () => {
    if (timer) clearTimeout(timer);
    timer = null;
    if (held.length === 0) return;
    const lines = held;
    held = [];
    write(`${lines.join('\n')}\n`);
  };
  const add = (level: 'info' | 'error', event: string, fields: LogLine) => {
    held.push(JSON.stringify({ at: now().toISOString(), level, event, ...fields }));
    if (!timer) timer = setTimeout(flush, 250).unref();
  };
  return {
    info: (event, fields = {}) => add('info', event, fields),
    error: (event, error, fields = {}) => {
      add('error', event, { ...fields, ...faultFields(error) });
      flush();
    },
    flush,
  };
}
