import { Form, useLocation } from 'react-router'
import { Button } from './button'

/** A form as it was typed when it could not be saved: everything in it goes again to the same address. */
export function KeptForm({ typed }: { typed: Record<string, string | string[]> }) {
  const { pathname, search } = useLocation()
  const values = Object.entries(typed).flatMap(([name, value]) =>
    [value].flat().map(one => [name, one] as const),
  )
  const shown = values.filter(([, value]) => /\s|[^\w-]/.test(value))
  return (
    <Form method="post" action={pathname + search} className="mt-6">
      {values.map(([name, value]) => (
        <input key={`${name}=${value}`} type="hidden" name={name} value={value} />
      ))}
      <p>What you typed is kept on this page:</p>
      <ul className="my-3 border-t border-rule">
        {shown.map(([name, value]) => (
          <li key={`${name}=${value}`} className="whitespace-pre-line border-b border-rule py-2">
            {value}
          </li>
        ))}
      </ul>
      <Button kind="action">Send it again</Button>
    </Form>
  )
}
