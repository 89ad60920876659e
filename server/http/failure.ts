/** Something that went wrong in a way the asker can be told about: one class, from any feature to the one error handler. */
export class DomainFailure extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
    readonly remedy: string,
    readonly more: { fields?: Record<string, string>; detail?: Record<string, unknown> } = {},
  ) {
    super(message);
    this.name = 'DomainFailure';
  }
}

export const notFound = () =>
  new DomainFailure(404, 'not-found', 'There is nothing here, or nothing that you may see.', 'Check the address, or ask an owner of the household.');
export const signInFirst = () => new DomainFailure(401, 'signed-out', 'You are not signed in.', 'Sign in and try again.');
export const notYourRole = () =>
  new DomainFailure(403, 'not-your-role', 'Your role in this household does not include this.', 'Ask an owner of the household to change your role.');
export const notPaired = () =>
  new DomainFailure(401, 'not-paired', 'This screen is not paired with a wall.', 'Enter the code it shows at the wall it hangs on.');
