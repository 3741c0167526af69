import { Tex } from '@/templates/screen/tex';

/**
 * Two equal spans l under a uniform load w on three supports: the moment at the middle support is -wl²/8 and the
 * largest moment in a span 9wl²/128, both textbook values for constant EI.
 */
export function FrontDrawing() {
  const moment = (x: number) => (3 / 8) * x - (x * x) / 2;
  const left = 60;
  const span = 210;
  const base = 130;
  const scale = 620;
  const steps = Array.from({ length: 41 }, (_, i) => i / 40);
  const first = steps.map((x) => [left + x * span, base + moment(x) * scale] as const);
  const second = steps.map((x) => [left + (2 - x) * span, base + moment(x) * scale] as const).reverse();
  const curve = [...first, ...second].map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`).join('L');
  const hatch = [...first, ...second].filter((_, i) => i % 3 === 0);
  const supports = [left, left + span, left + 2 * span];
  return (
    <aside className="front" aria-label="From a calculation">
      <div className="gridbox">
        <svg viewBox="0 0 540 250" role="img" aria-label="Bending moments of a beam of two equal spans">
          <g fill="none" stroke="var(--ink)">
            <path
              d={`M${left} ${base}L${curve}L${left + 2 * span} ${base}`}
              fill="#dce6f2"
              strokeWidth="1.3"
            />
            {hatch.map(([x, y]) => (
              <path
                key={x}
                d={`M${x.toFixed(1)} ${base}V${y.toFixed(1)}`}
                stroke="#8fa3be"
                strokeWidth="0.8"
              />
            ))}
            <path d={`M${left} ${base}H${left + 2 * span}`} strokeWidth="3" />
            {supports.map((x) => (
              <path key={x} d={`M${x} ${base + 2}l-9 15h18ZM${x - 14} ${base + 17}h28`} fill="var(--sheet)" />
            ))}
          </g>
          <g fill="var(--ink)" fontFamily="var(--ital)" fontStyle="italic" fontSize="18" textAnchor="middle">
            {['A', 'B', 'C'].map((name, i) => (
              <text key={name} x={left + i * span} y={base + 42}>
                {name}
              </text>
            ))}
          </g>
        </svg>
      </div>
      <div className="fronteq">
        <p className="i2">
          Two equal spans, uniform load, constant <Tex>EI</Tex>: the slope does not break at <Tex>B</Tex>.
        </p>
        <Tex
          display
        >{String.raw`\frac{2l}{3EI}\,M_B = -\,2\cdot\frac{w l^3}{24EI}\quad\Rightarrow\quad M_B = -\frac{w l^2}{8}`}</Tex>
      </div>
    </aside>
  );
}
