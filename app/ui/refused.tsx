/** Why something could not be done: it has moved on meanwhile. */
export function Refused({ reason }: { reason: string }) {
  return (
    <p role="alert" className="mt-4 border-t-2 border-ochre bg-ochre-wash px-4 py-3">
      {reason}
    </p>
  )
}
