/** The button that the Enter key presses in a form whose first button on the page does something lesser. */
export function FirstButton() {
  return <button type="submit" className="sr-only" tabIndex={-1} aria-hidden="true" />
}
