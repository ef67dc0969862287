import { expect, test } from 'vitest';
import { writeMail } from './compose.ts';

const body = {
  subject: 'A word',
  paragraphs: ['First.'],
  link: { label: 'Open', url: 'https://site.example/verify#token=a&b' },
  closing: ['Last.'],
};

test('the plain text holds the whole mail in order, the link on a line of its own', () => {
  const lines = writeMail(body).text.split('\n');
  expect(lines.indexOf('First.')).toBeLessThan(lines.indexOf('https://site.example/verify#token=a&b'));
  expect(lines.indexOf('https://site.example/verify#token=a&b')).toBeLessThan(lines.indexOf('Last.'));
});

test('the HTML says the same, and what people wrote cannot become markup', () => {
  const { html } = writeMail({ ...body, paragraphs: ['<img src=x onerror=alert(1)> & "quotes"'] });
  expect(html).toContain('&lt;img src=x onerror=alert(1)&gt; &amp; &quot;quotes&quot;');
  expect(html).not.toContain('<img');
  expect(html).toContain('href="https://site.example/verify#token=a&amp;b"');
  expect(html).not.toMatch(/<script|<[^>]* src=|@import|url\(/);
});

test('a line break in a subject begins no header', () => {
  expect(writeMail({ ...body, subject: 'Hello\r\nBcc: everyone@site.example' }).subject).toBe('Hello Bcc: everyone@site.example');
});
