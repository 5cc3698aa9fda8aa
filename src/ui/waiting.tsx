/** Something is being fetched: a short hairline that runs along a rule, and the words for it. */
export function Waiting({ children }: { readonly children: string }) {
  return (
    <div role="status" className="py-6 text-faint">
      <p>{children}</p>
      <div className="relative mt-3 h-px w-48 overflow-hidden bg-rule">
        <div className="absolute inset-y-0 w-12 bg-ink motion-safe:animate-[run_1.4s_linear_infinite]" />
      </div>
    </div>
  );
}
