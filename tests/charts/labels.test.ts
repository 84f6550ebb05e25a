import { describe, expect, it } from 'vitest';
import { cornersAround, overlap, placeLabels, textWidth } from '../../components/charts/labels';
import { composeFigureSvg, escapeXml, facesIn, wrapText } from '../../components/charts/figureSvg';

const bounds = { x: 0, y: 0, width: 400, height: 400 };

describe('placing labels', () => {
  it('takes the first candidate that covers nothing', () => {
    const placed = placeLabels(
      [{ key: 'a', width: 50, height: 20, candidates: [{ x: 100, y: 100 }, { x: 200, y: 100 }] }],
      [{ x: 110, y: 105, width: 10, height: 10 }],
      bounds,
    );
    expect(placed.get('a')).toMatchObject({ x: 200, y: 100 });
  });

  it('does not lay one label over another', () => {
    const candidates = cornersAround({ x: 200, y: 200 }, 80, 20, [10, 30]);
    const placed = placeLabels(['a', 'b', 'c'].map((key) => ({ key, width: 80, height: 20, candidates })), [], bounds);
    const boxes = [...placed.values()];
    expect(boxes).toHaveLength(3);
    boxes.forEach((box, index) => boxes.slice(index + 1).forEach((other) => expect(overlap(box, other)).toBe(0)));
  });

  it('keeps a label inside the plot when a place inside exists', () => {
    const placed = placeLabels([{ key: 'a', width: 60, height: 20, candidates: cornersAround({ x: 395, y: 5 }, 60, 20, [10]) }], [], bounds);
    const box = placed.get('a');
    expect(box && box.x >= 0 && box.x + 60 <= 400 && box.y >= 0 && box.y + 20 <= 400).toBe(true);
  });
});

describe('the saved figure', () => {
  it('breaks its caption at words so that no line is wider than the drawing', () => {
    const text = 'Allokarya: brain-tissue masses and cell counts, version 7. Frozen 2026-10-15. '.repeat(3).trim();
    const lines = wrapText(text, 300, 13);
    expect(lines.join(' ')).toBe(text);
    lines.forEach((line) => expect(textWidth(line, 13)).toBeLessThanOrEqual(300));
  });

  it('carries title, caption and fonts inside and escapes what they hold', () => {
    const { svg, width, height } = composeFigureSvg('<svg/>', { width: 300, height: 200 }, { title: 'Mass & neurons', lines: ['p < 0.001', 'version 7'] }, { ground: '#fff', ink: '#000', inkSoft: '#555' }, '@font-face{}');
    expect(svg).toContain('Mass &amp; neurons');
    expect(svg).toContain('p &lt; 0.001');
    expect(svg).toContain('version 7');
    expect(svg).toContain('@font-face{}');
    expect(width).toBeGreaterThan(300);
    expect(height).toBeGreaterThan(200);
    expect(escapeXml('"<&>"')).toBe('&quot;&lt;&amp;&gt;&quot;');
  });

  it('embeds only the faces that are used', () => {
    const faces = facesIn('<text style="font-family: Lora_400Regular_Italic, serif"/>');
    expect(faces).toContain('loraItalic');
    expect(faces).not.toContain('sansLight');
    expect(faces).not.toContain('loraMediumItalic');
  });
});
