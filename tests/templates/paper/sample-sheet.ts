import { drawStructure } from '@/lib/figures/draw-structure';
import { estimateText } from '@/lib/figures/measure-text';
import type { Block, TableBlock } from '@/templates/block';
import type { PrintedSheet } from '@/templates/paper/set-sheet';
import { portalWithCanopy } from '../../figures/sample-frames';

/** An invented sheet with every kind of block, long enough for several pages. */
const frame = drawStructure(portalWithCanopy, { width: 426, measure: estimateText });

const parts: TableBlock = {
  kind: 'table',
  id: '6.3',
  caption: 'Displacements at the hinges of the loaded primary structure, one row a part:',
  columns: [
    { head: 'Case', align: 'left' },
    { head: 'Part', align: 'left' },
    { head: 'Shape', align: 'left' },
    { head: 'Area $A$', unit: '\\mathrm{kN\\per m^2}', align: 'right' },
    { head: '$k$', align: 'right' },
    { head: '$\\bar m_1$', align: 'right' },
    { head: '$\\bar m_2$', align: 'right' },
    { head: '$A\\bar m_1/k$', align: 'right' },
    { head: '$A\\bar m_2/k$', align: 'right' },
  ],
  rows: [
    {
      cells: [
        '$D$',
        '$BC$',
        'parabola',
        '$167.962$',
        '$2$',
        '$\\tfrac12$',
        '$\\tfrac12$',
        '$41.990$',
        '$41.990$',
      ],
    },
    {
      cells: [
        '',
        '$BC$',
        'triangle',
        '$-50.933$',
        '$2$',
        '$\\tfrac13$',
        '$\\tfrac23$',
        '$-8.489$',
        '$-16.978$',
      ],
    },
    {
      cells: [
        '',
        '',
        '$EI_0\\,\\Delta_{1D}$ and $EI_0\\,\\Delta_{2D}$',
        '',
        '',
        '',
        '',
        '$33.502$',
        '$25.013$',
      ],
      emphasis: 'total',
    },
    {
      cells: ['$W$', '$AB$', 'spandrel', '$-38.896$', '$1$', '$1$', '$-\\tfrac34$', '$-38.896$', '$29.172$'],
      emphasis: 'group',
    },
    {
      cells: ['', '$BC$', 'triangle', '$15.746$', '$2$', '$\\tfrac13$', '$\\tfrac23$', '$2.624$', '$5.249$'],
    },
    {
      cells: [
        '',
        '',
        '$EI_0\\,\\Delta_{1W}$ and $EI_0\\,\\Delta_{2W}$',
        '',
        '',
        '',
        '',
        '$-36.272$',
        '$34.421$',
      ],
      emphasis: 'total',
    },
  ],
  note: 'Totals are sums of the exact rows; a last figure may differ by one from the sum of the printed ones.',
};

export const longTable: TableBlock = {
  kind: 'table',
  id: '8.1',
  caption: 'Combinations at the joints:',
  columns: [
    { head: 'Joint', align: 'left' },
    { head: 'Combination', align: 'left' },
    { head: '$M$', unit: '\\mathrm{kN\\per m}', align: 'right' },
    { head: '$V$', unit: '\\mathrm{kN}', align: 'right' },
  ],
  rows: Array.from({ length: 64 }, (_, index) => ({
    cells: [
      `$${index % 8 === 0 ? 'ABCDEFGH'[index / 8] : ''}$`,
      `$1.35D+1.5S+0.9W_{${index}}$`,
      `$${(index * 7.31 - 120).toFixed(2)}$`,
      `$${(index * 1.7 - 33).toFixed(2)}$`,
    ],
    emphasis: index % 8 === 0 ? ('group' as const) : index === 13 ? ('governing' as const) : undefined,
  })),
};

export const blocks: Block[] = [
  { kind: 'heading', id: '1', text: 'Basis' },
  {
    kind: 'paragraph',
    id: '1.1',
    source: 'S-01.2',
    text: 'Forces, base reactions and two deflections of the portal frame on grid 2 by consistent deformations, under dead load $D$, snow $S$ and wind $W$. The members bend, but neither stretch nor shear; step 9 measures what that leaves out. Walk the frame $A$–$B$–$C$–$D$: $M$ is positive with tension on the right-hand side of the walk.',
  },
  {
    kind: 'caution',
    id: '1.2',
    text: 'The forces depend only on the **relative** stiffnesses; $EI_0$ enters with the deflections and not before.',
  },
  { kind: 'heading', id: '2', text: 'Structure and loads' },
  {
    kind: 'figure',
    id: '2.1',
    source: 'QF-104 rev B',
    caption:
      'Figure 1. Frame on grid 2, case $S$. Dimensions in $\\mathrm{m}$; the dashed line marks the inner face.',
    drawings: [frame],
  },
  {
    kind: 'equations',
    id: '2.2',
    source: 'S-01.2, table 3',
    text: 'Dead load $D$: roof, glazing and steelwork; sign and gutter at $E$.',
    rows: [
      { lhs: 'w_D', chain: ['g\\,s', '1.20\\unit{kN/m^2}\\times 4.50\\unit{m}', '5.40\\unit{kN/m}'] },
      { lhs: 'P_D', chain: ['3.00\\unit{kN}'] },
    ],
  },
  {
    kind: 'equations',
    id: '2.3',
    source: 'EN 1991-1-3, 6.2',
    text: 'On the canopy snow drifts behind the sign, $h_s=0.70\\unit{m}$ high; its peak is taken over all of $C$–$E$:',
    rows: [
      {
        lhs: '\\mu_2',
        chain: [
          '\\frac{\\gamma\\,h_s}{s_k}',
          '\\frac{2.00\\unit{kN/m^3}\\times0.70\\unit{m}}{1.00\\unit{kN/m^2}}',
          '1.40',
        ],
        note: '($0.8\\le\\mu_2\\le2.0$)',
      },
      {
        lhs: 'w_{S,CE}',
        chain: ['\\mu_2 s_k\\,s', '1.40\\times1.00\\unit{kN/m^2}\\times4.50\\unit{m}', '6.30\\unit{kN/m}'],
      },
    ],
  },
  {
    kind: 'paragraph',
    id: '2.4',
    source: 'EN 1991-1-4, 7.2.2 and 7.3, with the national annex',
    text: 'Wind $W$ from the quay: pressure on $AB$, uplift under the canopy.',
  },
  { kind: 'heading', id: '6', text: 'Unit-load structures' },
  {
    kind: 'figure',
    id: '6.1',
    caption:
      'Figure 3. Moments $\\bar m_1$ and $\\bar m_2$ on the tension side; tension on the inner face is positive.',
    drawings: [
      drawStructure(portalWithCanopy, { width: 200, measure: estimateText }),
      drawStructure(portalWithCanopy, { width: 200, measure: estimateText }),
    ],
  },
  {
    kind: 'equations',
    id: '6.2',
    text: 'Flexibility coefficients, areas times ordinates over $k=EI/EI_0$:',
    rows: [
      { lhs: 'EI_0\\,f_{11}', chain: ['4.20\\times1+\\frac{7.20}{3\\times2}', '5.400\\unit{m}'] },
      { lhs: 'EI_0\\,f_{12}', chain: ['-\\frac{4.20}{2}+\\frac{7.20}{6\\times2}', '-1.500\\unit{m}'] },
      {
        lhs: 'EI_0\\,f_{22}',
        chain: ['\\frac{4.20}{3}+\\frac{7.20}{3\\times2}+\\frac{4.20}{3}', '4.000\\unit{m}'],
      },
    ],
  },
  parts,
  { kind: 'heading', id: '7', text: 'Compatibility and solution' },
  {
    kind: 'equations',
    id: '7.1',
    text: 'Neither hinge opens:',
    rows: [
      {
        lhs: '\\begin{bmatrix}5.400&-1.500\\\\-1.500&4.000\\end{bmatrix}\\begin{bmatrix}X_1\\\\X_2\\end{bmatrix}+\\begin{bmatrix}33.502\\\\25.013\\end{bmatrix}=\\begin{bmatrix}0\\\\0\\end{bmatrix}',
        chain: [],
      },
      {
        lhs: 'X_1',
        chain: [
          '-\\frac{EI_0\\,\\delta_{10}}{EI_0f_{11}}',
          '-\\frac{28\\,177.46\\unit{kN\\per m^3}}{7\\,209.60\\unit{m^3}}',
          '-3.9083\\unit{kN}',
        ],
        boxed: true,
      },
      {
        lhs: 'M_{BC}',
        chain: [
          'R_{1y}\\,a-\\frac{wL}{\\ell}\\,\\frac{a^2}{2}+X_1^{\\mathrm{D}}\\bar m_1+X_2^{\\mathrm{D}}\\bar m_2',
          '15.550\\unit{kN}\\times14.00\\unit{m}-\\frac{24.60\\unit{kN}}{40.00\\unit{m}}\\times\\frac{(14.00\\unit{m})^2}{2}-3.9083\\times1-2.204\\times\\tfrac12',
          '157.43\\unit{kN\\per m}',
        ],
      },
    ],
  },
  { kind: 'heading', id: '8', text: 'Combinations' },
  longTable,
];

export const sheet: PrintedSheet = {
  number: 'S-03',
  title: 'Portal frame, grid 2',
  blocks,
  marks: {
    '1.1': { mark: 'agrees' },
    '2.1': { mark: 'agrees' },
    '2.2': { mark: 'agrees' },
    '2.3': { mark: 'query', changedIn: 2 },
    '6.3': { changedIn: 2 },
  },
  markedBy: 'JO',
};
