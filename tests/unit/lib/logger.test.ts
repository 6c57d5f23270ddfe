import { describe, expect, it } from 'vitest';
import { createLogger } from '#src/lib/logger.ts';

function collect(): { lines: string[]; destination: { write: (line: string) => void } } {
  const lines: string[] = [];
  return { lines, destination: { write: (line) => lines.push(line) } };
}

describe('the log', () => {
  it('writes one JSON object a line, with level and time', () => {
    const { lines, destination } = collect();
    createLogger({ level: 'info', destination }).info({ requestId: 'abc' }, 'request');
    expect(lines).toHaveLength(1);
    expect(JSON.parse(lines[0] ?? '')).toMatchObject({ level: 'info', requestId: 'abc', msg: 'request' });
  });

  it.each(['cookie', 'authorization', 'x-api-key', 'password', 'set-cookie'])(
    'hides %s at every depth',
    (field) => {
      const { lines, destination } = collect();
      const log = createLogger({ level: 'info', destination });
      log.info(
        { [field]: 'hush-1', headers: { [field]: 'hush-2' }, req: { headers: { [field]: 'hush-3' } } },
        'request',
      );
      expect(lines.join('')).not.toContain('hush');
      expect(lines.join('')).toContain('[hidden]');
    },
  );

  it('takes passwords out of addresses, also inside the message and stack of an error', () => {
    const { lines, destination } = collect();
    const log = createLogger({ level: 'info', destination });
    log.error(
      { err: new Error('cannot reach postgres://wl_app:hush@db:5432/wl') },
      'failed at postgres://a:hush@b/c',
    );
    expect(lines.join('')).not.toContain('hush');
    expect(lines.join('')).toContain('postgres://***@db:5432/wl');
  });

  it('says nothing below its level', () => {
    const { lines, destination } = collect();
    createLogger({ level: 'warn', destination }).info('not this');
    expect(lines).toEqual([]);
  });
});
