// @vitest-environment jsdom
import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { standaloneSvg } from '@/components/charts/quality/save-picture';

describe('a chart saved as SVG', () => {
  it('stands alone: colours and fonts written into it, a ground of paper, nothing of the reader in it', () => {
    const { container } = render(
      <div>
        <svg viewBox="0 0 10 10">
          <path d="M0 0h5" stroke="var(--sw-trip)" />
          <text className="font-num">10.80</text>
          <g data-chosen-mark="">
            <path d="M1 1v9" />
          </g>
        </svg>
      </div>,
    );
    const svg = container.querySelector('svg')!;
    for (const [name, value] of [
      ['--sw-trip', '#670446'],
      ['--sw-paper', '#E7E4DB'],
      ['--sw-num', 'Figures, monospace'],
      ['--sw-text', 'Words, sans-serif'],
    ] as const)
      svg.style.setProperty(name, value);
    const text = standaloneSvg(svg);
    const copy = new DOMParser().parseFromString(text, 'image/svg+xml').documentElement;
    expect(copy.querySelector('parsererror')).toBeNull();
    expect(copy.querySelector('path')!.getAttribute('stroke')).toBe('#670446');
    expect(copy.querySelector('text')!.getAttribute('font-family')).toBe('Figures, monospace');
    expect(copy.getAttribute('font-family')).toBe('Words, sans-serif');
    expect(copy.firstElementChild!.getAttribute('fill')).toBe('#E7E4DB');
    expect(copy.querySelector('[data-chosen-mark]')).toBeNull();
    expect(text).not.toMatch(/var\(|class=/);
  });
});
