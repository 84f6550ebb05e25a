import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonicalJson } from '../../../shared/domain/canonicalJson';
import { sectionOf } from '../../../shared/domain/section';
import { fittedNumber, shortestNumber } from '../../../shared/domain/shortestNumber';

describe('canonical JSON', () => {
  it('orders keys by their UTF-16 code units, as the example of RFC 8785 does', () => {
    // RFC 8785, 3.2.3.
    const value = { '€': 'Euro Sign', '\r': 'Carriage Return', '\u05d3': 'Hebrew Letter Dalet With Dagesh', '1': 'One', '😀': 'Emoji: Grinning Face', '\u0080': 'Control', 'ö': 'Latin Small Letter O With Diaeresis' };
    const keys = [...canonicalJson(value).matchAll(/"([^"]+)":"/g)].map((match) => match[1]);
    expect(keys).toEqual(['\\r', '1', '\u0080', 'ö', '\u05d3', '€', '😀']);
  });

  it('writes numbers and strings as the example of RFC 8785 does', () => {
    // RFC 8785, 3.2.2.
    const value = { numbers: [Number('333333333.33333329'), 1e30, 4.5, 2e-3, 0.000000000000000000000000001], string: '€$\u000f\nA\'B"\\\\"/', literals: [null, true, false] };
    expect(canonicalJson(value)).toBe('{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}');
  });

  it('is the same for the same content in any order, and reads back', () => {
    fc.assert(
      fc.property(fc.dictionary(fc.string(), fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.string(), fc.boolean(), fc.constant(null))), (value) => {
        const backward = Object.fromEntries(Object.entries(value).reverse());
        expect(canonicalJson(backward)).toBe(canonicalJson(value));
        expect(canonicalJson(JSON.parse(canonicalJson(value)))).toBe(canonicalJson(value));
      }),
    );
  });

  it('leaves undefined out and refuses what it would lose', () => {
    expect(canonicalJson({ b: undefined, a: -0 })).toBe('{"a":0}');
    for (const value of [NaN, Infinity, '\ud800']) expect(() => canonicalJson(value)).toThrow(RangeError);
    for (const value of [new Date(0), new Map(), 10n, [undefined], () => 1]) expect(() => canonicalJson(value)).toThrow(TypeError);
  });
});

describe('numbers in files', () => {
  it('are the shortest that read back', () => {
    expect(shortestNumber(0.1)).toBe('0.1');
    expect(shortestNumber(-0)).toBe('0');
    expect(shortestNumber(128_500_000)).toBe('128500000');
    fc.assert(fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => Number(shortestNumber(value)) === value));
    expect(() => shortestNumber(NaN)).toThrow(RangeError);
  });

  it('are cut to twelve digits where they were fitted', () => {
    expect(fittedNumber(1.51234567890123)).toBe(1.5123456789);
    expect(fittedNumber(2 / 3)).toBe(0.666666666667);
    expect(() => fittedNumber(Infinity)).toThrow(RangeError);
  });
});

describe('the section of a version', () => {
  // Bytes 00, ff, 37, then zeros: worked by hand from the rule.
  const digest = `00ff37${'00'.repeat(29)}`;
  const nuclei = sectionOf(digest, { width: 160, height: 44 });

  it('has one nucleus for each byte, in 16 columns and two rows', () => {
    expect(nuclei).toHaveLength(32);
    expect(nuclei[16]?.cx).toBeCloseTo(1.8, 10);
    expect(nuclei[16]?.cy).toBeCloseTo(22 + 0.16 * 22, 10);
  });

  it('puts, sizes, flattens, turns and shades a nucleus by its byte', () => {
    expect(nuclei[0]).toEqual({ cx: 1.7999999999999998, cy: 3.52, rx: 1.5, ry: 1.5 * 0.7, angleDegrees: 0, opacity: 0.45 });
    // 255: 37·255 mod 256 = 219, 91·255 mod 64 = 37, 53·255 mod 180 = 15, 13·255 mod 16 = 3.
    const bright = nuclei[1];
    expect(bright?.cx).toBeCloseTo(18.2, 10);
    expect(bright?.cy).toBeCloseTo(0.84 * 22, 10);
    expect(bright?.rx).toBeCloseTo(1.5 + (3 * 219) / 256, 10);
    expect(bright?.ry).toBeCloseTo((1.5 + (3 * 219) / 256) * (0.7 + (0.5 * 37) / 64), 10);
    expect(bright?.angleDegrees).toBe(15);
    expect(bright?.opacity).toBeCloseTo(0.45 + (0.55 * 3) / 15, 10);
    // 0x37 = 55: high nibble 3, low nibble 7.
    expect(nuclei[2]?.cx).toBeCloseTo(20 + 10 * (0.18 + 0.64 * 0.2), 10);
    expect(nuclei[2]?.cy).toBeCloseTo(22 * (0.16 + (0.68 * 7) / 15), 10);
    expect(nuclei[2]?.angleDegrees).toBe(35);
  });

  it('keeps every nucleus within its cell', () => {
    fc.assert(
      fc.property(fc.uint8Array({ minLength: 32, maxLength: 32 }), (bytes) => {
        const hex = [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('');
        sectionOf(hex, { width: 320, height: 44 }).forEach((nucleus, i) => {
          expect(Math.floor(nucleus.cx / 20)).toBe(i % 16);
          expect(Math.floor(nucleus.cy / 22)).toBe(Math.floor(i / 16));
        });
      }),
    );
  });

  it('refuses what is no digest', () => {
    expect(() => sectionOf('abc', { width: 1, height: 1 })).toThrow(RangeError);
    expect(() => sectionOf(digest, { width: 0, height: 1 })).toThrow(RangeError);
  });
});
