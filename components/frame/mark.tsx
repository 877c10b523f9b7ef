/** The mark: three warp threads, crossed by weft that goes over and under them. */
export function Mark({ size = 26 }: { size?: number }) {
  return (
    <svg aria-hidden="true" viewBox="0 0 28 28" width={size} height={size} fill="none" strokeWidth="3.2" strokeLinecap="round" className="keep-colour shrink-0">
      <path d="M6 2.5v23M14 2.5v23M22 2.5v23" stroke="var(--indigo)" />
      <path d="M2.5 8h6.2M19.3 8h6.2M11.2 14h5.6M2.5 20h6.2M19.3 20h6.2" stroke="var(--madder)" />
    </svg>
  );
}
