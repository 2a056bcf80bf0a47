import { describe, expect, it } from 'vitest';
import { dress, type Letter } from '@/lib/server/mail/letter';

const LETTER: Letter = {
  subject: 'A subject',
  greeting: 'Mira',
  plate: { title: 'U-1001 Bakery sign', line: 'Proof' },
  sentence: 'Your proof is ready.',
  paragraphs: ['First.', 'Second line one.\nLine two.'],
  action: { label: 'See the proof', url: 'https://shop.example/orders/U-1001?a=1&b=2' },
  margin: 'A note.',
};

describe('dress', () => {
  it('says the same in plain text and in HTML', () => {
    const { text, html } = dress('kind', LETTER);
    for (const part of [
      'U-1001 Bakery sign',
      'Proof',
      'Mira,',
      'Your proof is ready.',
      'First.',
      'Line two.',
      'See the proof',
      'A note.',
    ]) {
      expect(text).toContain(part);
      expect(html).toContain(part);
    }
    expect(text).toContain('https://shop.example/orders/U-1001?a=1&b=2');
    expect(html).toContain('href="https://shop.example/orders/U-1001?a=1&#38;b=2"');
  });

  it('lets no word of a customer become markup', () => {
    const { html } = dress('kind', {
      ...LETTER,
      greeting: '<script>x</script>',
      sentence: '"><img src=x>',
      plate: { title: '<b>', line: "'" },
    });
    expect(html).not.toMatch(/<script|<img|<b>/);
    expect(html).toContain('&#60;script&#62;');
  });

  it('lets no subject become a second header', () => {
    expect(dress('kind', { ...LETTER, subject: 'One\r\nBcc: all@shop.example' }).subject).toBe(
      'One Bcc: all@shop.example',
    );
  });

  it('leaves out what there is not', () => {
    const { text, html } = dress('kind', { ...LETTER, greeting: '', action: null, paragraphs: [] });
    expect(text).not.toMatch(/^,/m);
    expect(html).not.toContain('<a ');
    expect(text).not.toMatch(/\n{3}/);
  });

  it('loads nothing from anywhere: styles are inline, no picture, no script, light only', () => {
    const { html } = dress('kind', LETTER);
    expect(html).not.toMatch(/<link|<style|<script|<img|src=|url\(/);
    expect(html).toContain('content="light"');
  });
});
