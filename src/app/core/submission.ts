import { signal } from '@angular/core';
import type { FormGroup } from '@angular/forms';
import { type ApiFailure, toApiFailure } from './api-failure';

/** One form being sent: not twice at once, its failure kept to be shown, the server's words put at the fields they speak of. */
export class Submission {
  readonly busy = signal(false);
  readonly failure = signal<ApiFailure | null>(null);

  constructor(private readonly form?: FormGroup) {}

  /** Runs `send` if the form is valid; otherwise its fields say why, and an older failure goes. What was typed stays whatever happens. */
  async run(send: () => Promise<void>): Promise<void> {
    this.form?.markAllAsTouched();
    if (this.busy()) return;
    this.failure.set(null);
    if (this.form?.invalid) return;
    this.busy.set(true);
    try {
      await send();
    } catch (error) {
      const failure = toApiFailure(error);
      this.failure.set(failure);
      for (const [field, message] of Object.entries(failure.failure.fields ?? {}))
        this.form?.get(field)?.setErrors({ contract: message });
    } finally {
      this.busy.set(false);
    }
  }
}
