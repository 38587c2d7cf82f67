/** The key that does what stands beside it. */
export function Kbd({ children }: { readonly children: string }) {
  return (
    <kbd className="inline-flex h-5 min-w-5 items-center justify-center rounded border border-current px-1 font-mono text-xs leading-none font-semibold">
      {children}
    </kbd>
  );
}
