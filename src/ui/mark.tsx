/** The product's mark: a device's curve, and the point resting just past its knee. */
export function Mark({ size = 24 }: { readonly size?: number }) {
  return (
    <svg viewBox="0 0 24 24" width={size} height={size} fill="none" stroke="currentColor" aria-hidden="true">
      <path d="M1.5 1V22.5H23.5" />
      {/* A parabola up to the knee, as the square law has it, then a plateau that still climbs a little. */}
      <path d="M1.5 22.5Q6 8 10.5 8L23 6.2" strokeWidth={2} />
      <circle cx="13" cy="7.6" r="3.6" fill="currentColor" stroke="none" />
    </svg>
  );
}
