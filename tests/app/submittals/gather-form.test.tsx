import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { GatherForm } from '@/app/jobs/[job]/submittals/new/gather-form';

const never = () => Promise.reject(new Error('no form is sent here'));
const checked = { number: 'S-01', title: 'Beam', revisionId: 'r1', why: '', revision: 0 };
const other = { number: 'S-02', title: 'Frame', revisionId: null, why: 'with its checker', revision: 0 };

test('offers the checked sheet and says what the other lacks', () => {
  const html = renderToStaticMarkup(<GatherForm action={never} sheets={[checked, other]} />);
  expect(html.match(/<input type="checkbox"[^>]*disabled/g)).toHaveLength(1);
  expect(html).toContain('with its checker');
  expect(html).toContain('Print the package');
});

test('has nothing to print where no sheet is checked', () => {
  const html = renderToStaticMarkup(<GatherForm action={never} sheets={[other]} />);
  expect(html).toContain('No sheet of this job is checked yet.');
  expect(html).not.toContain('Print the package');
});
