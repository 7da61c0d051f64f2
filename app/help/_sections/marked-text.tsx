/** Text in which what stands between backticks is set as code. */
export function MarkedText({ text }: { text: string }) {
  return <>{text.split('`').map((piece, index) => (index % 2 === 1 ? <code key={index}>{piece}</code> : piece))}</>;
}
