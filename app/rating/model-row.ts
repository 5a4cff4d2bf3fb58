import type { ModelRow } from './model'

type Said = { unit?: string; source?: string; mark?: string }

const ours = 'judgement of this project, to be put before a panel of rebolters'

/** A row with its own ends. */
export function row(name: string, low: number, central: number, high: number, said: Said = {}): ModelRow {
  return {
    name,
    low,
    central,
    high,
    unit: said.unit ?? '',
    source: said.source ?? ours,
    mark: said.mark ?? 'ours',
  }
}

/** A row whose ends are factors of its central value. */
export function around(name: string, central: number, down: number, up: number, said: Said = {}): ModelRow {
  return row(name, central * down, central, central * up, said)
}

/** A row without a range. */
export function fixed(name: string, central: number, said: Said = {}): ModelRow {
  return row(name, central, central, central, said)
}
