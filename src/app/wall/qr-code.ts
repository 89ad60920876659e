import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { encodeQR } from 'qr';

/** Free modules that ISO/IEC 18004 asks for around the symbol. */
const quietModules = 4;

/** A QR code, dark on light whatever the page's light: many readers know it in no other way. */
@Component({
  selector: 'oriel-qr-code',
  template: `
    <svg [attr.viewBox]="'0 0 ' + symbol().size + ' ' + symbol().size" role="img" [attr.aria-label]="'QR code of ' + text()" shape-rendering="crispEdges">
      <rect width="100%" height="100%" fill="#fff" />
      <path [attr.d]="symbol().path" fill="#000" />
    </svg>
  `,
  styles: 'svg { display: block; width: 100%; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QrCode {
  readonly text = input.required<string>();

  protected readonly symbol = computed(() => {
    const rows = encodeQR(this.text(), 'raw', { ecc: 'medium', border: quietModules });
    const path = rows.map((row, y) => row.map((dark, x) => (dark ? `M${x} ${y}h1v1h-1z` : '')).join('')).join('');
    return { path, size: rows.length };
  });
}
