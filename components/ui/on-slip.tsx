/** On a phone's slip the column's word stands before its figure. */
export function OnSlip({ children }: { children: string }) {
  return <span className="text-ink-soft md:hidden">{children} </span>;
}
