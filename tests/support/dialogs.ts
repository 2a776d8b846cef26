/** The browser's dialog, as far as our pages use it: the pages' test environment has none. */
export function giveDialogs(): void {
  HTMLDialogElement.prototype.showModal = function show() {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function close() {
    this.open = false;
  };
}
