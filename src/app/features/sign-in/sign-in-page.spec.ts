import { localPath } from './sign-in-page';

describe('the way on after signing in', () => {
  it.each(['/lasers?q=532', '/evaluations/e1#steps', '/today'])('goes to %s', (next) => {
    expect(localPath(next)).toBe(next);
  });

  it.each([
    undefined,
    '',
    '//evil.example',
    '/\\evil.example',
    'https://evil.example',
    'https:evil.example',
    'javascript:alert(1)',
    '\\\\evil.example',
    '/sign-in?next=/sign-in',
    ' /today',
  ])('stays on this site when asked for %s', (next) => {
    expect(localPath(next)).toBe('/today');
  });
});
