/** One allowed change of state: from, to, the action of the permission table it asks for, and what it needs. */
export interface Move<State extends string, Action extends string> {
  from: State
  to: State
  may: Action | 'system'
  needs?: string
}

/** The row that allows `from → to`, or null: guard, button and test all ask here. */
export function findMove<S extends string, A extends string>(
  moves: readonly Move<S, A>[],
  from: S,
  to: S,
): Move<S, A> | null {
  return moves.find(move => move.from === from && move.to === to) ?? null
}
