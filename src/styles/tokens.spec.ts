import { ChangeDetectionStrategy, Component, ViewEncapsulation } from '@angular/core';
import { TestBed } from '@angular/core/testing';

/** Loads the token file itself, whatever the test target's styles are. */
@Component({
  selector: 'kv-token-sheet',
  template: '',
  styleUrl: './tokens.css',
  encapsulation: ViewEncapsulation.None,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class TokenSheet {}

type Theme = 'light' | 'dark';

const grounds = ['paper', 'raised', 'sunken'] as const;

/** Words need 4.5:1, marks and edges 3:1 (WCAG 2.2, 1.4.3 and 1.4.11). */
const pairs: readonly { front: string; grounds: readonly string[]; least: number }[] = [
  { front: 'ink', grounds: [...grounds, 'copper-wash', 'plum-wash', 'spruce-wash'], least: 4.5 },
  { front: 'soft-ink', grounds: [...grounds, 'copper-wash', 'spruce-wash'], least: 4.5 },
  { front: 'spruce', grounds, least: 4.5 },
  { front: 'on-spruce', grounds: ['spruce'], least: 4.5 },
  { front: 'copper', grounds: [...grounds, 'copper-wash', 'spruce-wash'], least: 4.5 },
  { front: 'plum', grounds: [...grounds, 'plum-wash', 'plum-wash-strong'], least: 4.5 },
  { front: 'on-plum', grounds: ['plum'], least: 4.5 },
  { front: 'edge', grounds, least: 3 },
  { front: 'slate', grounds: [...grounds, 'copper-wash'], least: 3 },
  { front: 'ochre', grounds, least: 3 },
  { front: 'brick', grounds, least: 4.5 },
];

function luminance(color: string): number {
  const channels = /rgb\((\d+), (\d+), (\d+)\)/.exec(color);
  if (channels === null) throw new Error(`expected an opaque rgb colour; found ${color}`);
  const [red, green, blue] = channels.slice(1).map((text) => {
    const share = Number(text) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(first: string, second: string): number {
  const [light, dark] = [luminance(first), luminance(second)].sort((a, b) => b - a);
  return (light + 0.05) / (dark + 0.05);
}

describe('colour tokens', () => {
  let probe: HTMLElement;

  beforeEach(() => {
    TestBed.createComponent(TokenSheet);
    probe = document.createElement('i');
    document.body.append(probe);
  });

  afterEach(() => {
    probe.remove();
    document.documentElement.removeAttribute('data-theme');
  });

  function colorOf(token: string, theme: Theme): string {
    document.documentElement.setAttribute('data-theme', theme);
    probe.style.color = `var(--kv-${token})`;
    return getComputedStyle(probe).color;
  }

  for (const theme of ['light', 'dark'] as const)
    for (const { front, grounds: backs, least } of pairs)
      it(`keeps ${front} readable in the ${theme} theme, at ${least}:1 or more`, () => {
        for (const back of backs)
          expect(contrast(colorOf(front, theme), colorOf(back, theme)))
            .withContext(`${front} on ${back}`)
            .toBeGreaterThanOrEqual(least);
      });

  it('has a different value in each theme', () => {
    expect(colorOf('copper', 'light')).not.toBe(colorOf('copper', 'dark'));
  });
});
