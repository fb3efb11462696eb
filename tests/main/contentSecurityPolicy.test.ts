import { expect, test } from 'vitest';
import { CONTENT_SECURITY_POLICY, POLICY_HEADER } from '../../src/main/contentSecurityPolicy';
import { read } from '../house/files';

test('the page repeats the policy of the header, but for what only a header may say', () => {
  const meta = /http-equiv="Content-Security-Policy"\s+content="([^"]+)"/.exec(
    read('src/renderer/index.html'),
  );
  expect(meta?.[1]).toBe(CONTENT_SECURITY_POLICY);
  expect(POLICY_HEADER).toBe(`${CONTENT_SECURITY_POLICY}; frame-ancestors 'none'`);
});

test('nothing is allowed by default, and scripts only from our own files', () => {
  const rules = new Map(
    CONTENT_SECURITY_POLICY.split('; ').map((rule) => [
      rule.split(' ')[0],
      rule.split(' ').slice(1).join(' '),
    ]),
  );
  expect(rules.get('default-src')).toBe("'none'");
  expect(rules.get('script-src')).toBe("'self'");
  expect(CONTENT_SECURITY_POLICY).not.toContain('unsafe-eval');
});
