import type { Config } from 'tailwindcss';

const names = [
  'ink',
  'ink2',
  'ink3',
  'edge',
  'line',
  'line2',
  'paper',
  'sheet',
  'desk',
  'hover',
  'pen',
  'tick',
  'fix',
  'ask',
  'seal',
  'rose',
];

export default {
  content: ['./app/**/*.{ts,tsx}', './templates/**/*.{ts,tsx}'],
  theme: {
    extend: {
      colors: Object.fromEntries([
        ...names.map((name) => [name, `var(--${name})`]),
        ...['pen', 'fix', 'ask', 'tick', 'seal'].map((name) => [`${name}-wash`, `var(--${name}-wash)`]),
      ]),
      fontFamily: { sans: ['Inter', 'system-ui', 'sans-serif'], num: ['var(--num)'] },
    },
  },
} satisfies Config;
