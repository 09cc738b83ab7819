import { describe, expect, test } from 'vitest';
import { createLog, describePath } from '../../server/log.ts';

function collect(write: (log: ReturnType<typeof createLog>) => void): string {
  let lines = '';
  write(createLog('trace', { write: (line) => void (lines += line) }));
  return lines;
}

describe('the log', () => {
  test('keeps ids and states', () => {
    const lines = collect((log) => log.info({ paper: 'p1', status: 'read' }, 'paper read'));
    expect(JSON.parse(lines)).toMatchObject({ paper: 'p1', status: 'read', msg: 'paper read' });
  });

  test('drops passwords, tokens, addresses and what stands on a paper', () => {
    const secrets = {
      password: 'pw-marker',
      token: 'tk-marker',
      email: 'mail-marker',
      text: 'page-marker',
      user: { name: 'fine', email: 'inner-marker', password: 'deep-marker' },
      req: { method: 'POST', url: '/api/session?q=query-marker', headers: { cookie: 'c-marker' } },
    };
    const lines = collect((log) => log.warn(secrets, 'careful'));
    expect(lines).not.toContain('marker');
    expect(lines).toContain('/api/session');
  });
});

describe('the path of a request in the log', () => {
  test('has no query and no long random part', () => {
    expect(describePath('/api/papers?q=divorce')).toBe('/api/papers');
    expect(describePath(`/api/invitations/${'A1b_'.repeat(11)}`)).toBe('/api/invitations/…');
    expect(describePath('/api/papers/0b3e0f0e-6f5c-4b6e-9d5a-0a1b2c3d4e5f')).toBe(
      '/api/papers/0b3e0f0e-6f5c-4b6e-9d5a-0a1b2c3d4e5f',
    );
  });
});
