/** Changed in revision n: a triangle with the number, as on paper. */
export function DeltaMark({ revision }: { revision: number }) {
  return (
    <svg
      className="delta"
      width="17"
      height="15"
      viewBox="0 0 17 15"
      role="img"
      aria-label={`changed in revision ${revision}`}
    >
      <path d="M8.5 1L16 14L1 14Z" fill="none" stroke="currentColor" strokeWidth="1.1" />
      <text x="8.5" y="12.2" textAnchor="middle" fontSize="8.4" fontWeight="600" fill="currentColor">
        {revision}
      </text>
    </svg>
  );
}
