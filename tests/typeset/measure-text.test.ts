import { describe, expect, it } from 'vitest';
import { layOutTex } from '@/lib/typeset/lay-out-tex';
import { measureText } from '@/lib/typeset/measure-text';
import { createTypesetter } from '@/lib/typeset/typesetter';
import { faces } from './faces';

const typesetter = createTypesetter(faces);

describe('measuring a label', () => {
  it('gives mathematics the width of its glyphs', () => {
    const { width } = measureText('$5.40\\unit{kN/m}$', 10, typesetter);
    expect(width).toBeCloseTo(layOutTex('5.40\\unit{kN/m}', false, faces).width * 10, 6);
  });

  it('grows with the size', () => {
    const [small, large] = [
      measureText('roof $w_S$', 8, typesetter),
      measureText('roof $w_S$', 16, typesetter),
    ];
    expect(large.width).toBeCloseTo(2 * small.width, 6);
    expect(large.height).toBeCloseTo(2 * small.height, 6);
  });

  it('finds no extent in nothing', () => {
    expect(measureText('', 10, typesetter)).toEqual({ width: 0, height: 0, depth: 0 });
  });
});
