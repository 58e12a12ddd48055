import { pino } from 'pino';
import type { DestinationStream, Logger } from 'pino';

// Percent-encoded too, because addresses turn up in paths and queries.
const address = /[^\s"'<>@,;:/?&=()]+(?:@|%40)[^\s"'<>@,;:/?&=()]+/gi;
const personal =
  /^(?:e?mail|to|from|(?:full|first|last)?name|phone|address|code|token|cookies?|set-cookie|authorization|password|secret|parameters|sql|body|text)$/i;
const deepest = 5;

/** Masks every e-mail address in a piece of text, percent-encoded ones included. */
export function maskAddresses(text: string): string {
  return text.replace(address, '[address]');
}

/**
 * A copy of `value` that may be written to a log: addresses masked, fields that hold personal data or secrets replaced,
 * and of an error only its kind, code, message and stack (a database error also carries the statement's parameters).
 */
export function withoutPersonalData(value: unknown, depth = 0): unknown {
  if (typeof value === 'string') return maskAddresses(value);
  if (typeof value !== 'object' || value === null) return value;
  if (depth === deepest) return '[deeper]';
  if (value instanceof Error) {
    const { name, message, stack = '', cause } = value;
    const code = (value as NodeJS.ErrnoException).code;
    return {
      type: name,
      ...(code === undefined ? {} : { code }),
      message: maskAddresses(message),
      stack: maskAddresses(stack),
      ...(cause instanceof Error ? { cause: withoutPersonalData(cause, depth + 1) } : {}),
    };
  }
  if (value instanceof Date) return value.toISOString();
  if (Array.isArray(value)) return value.map((item) => withoutPersonalData(item, depth + 1));
  return Object.fromEntries(
    Object.entries(value).map(([key, item]) => [
      key,
      personal.test(key) ? '[personal]' : withoutPersonalData(item, depth + 1),
    ]),
  );
}

function messageOf(fields: unknown): string {
  const holds = typeof fields === 'object' && fields !== null && 'err' in fields;
  const error = holds ? fields.err : undefined;
  return error instanceof Error ? error.message : '';
}

/** A logger that writes JSON lines without personal data, to `destination` or standard output. */
export function createLog(level: string, destination?: DestinationStream): Logger {
  return pino(
    {
      level,
      base: null,
      timestamp: pino.stdTimeFunctions.isoTime,
      formatters: {
        level: (label) => ({ level: label }),
        log: (fields) => withoutPersonalData(fields) as Record<string, unknown>,
      },
      // Errors are already plain after `formatters.log`.
      serializers: { err: (error: unknown) => error },
      hooks: {
        logMethod(args, method) {
          const [first, ...rest] = args as unknown[];
          const fields = first instanceof Error ? { err: first } : first;
          const texts = rest.map((arg) => (typeof arg === 'string' ? maskAddresses(arg) : arg));
          // Without a text pino would take the error's message as it is.
          const implied = texts.length === 0 ? messageOf(fields) : '';
          if (implied !== '') texts.push(maskAddresses(implied));
          const start = typeof fields === 'string' ? maskAddresses(fields) : fields;
          method.apply(this, [start, ...texts] as Parameters<typeof method>);
        },
      },
    },
    destination,
  );
}

/** The process's log, on standard output. The level is LOG_LEVEL, read directly so that a wrong environment can be logged. */
export const log: Logger = createLog(process.env.LOG_LEVEL ?? 'info');
