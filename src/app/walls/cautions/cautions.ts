import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The trade's cautions, wherever somebody is about to hang a screen and a camera. */
@Component({
  selector: 'oriel-cautions',
  template: `
    <ul>
      <li><strong>Mounting:</strong> screw into the wall itself with fixings rated for several times the weight, by the screen’s own threaded holes. Hang nothing over a bed or a cot.</li>
      <li><strong>Mains:</strong> a socket that stays reachable, no plug pinched behind the screen, cables not under tension. Leave fixed wiring to an electrician.</li>
      <li><strong>Heat:</strong> keep a hand’s breadth of air above and some behind; do not build screen and computer into a closed frame. Touch both after an hour: warm is right, hot is not.</li>
      <li><strong>Discomfort:</strong> a picture that moves as one passes makes some people unwell. Let everyone of the household try it for a minute; where it troubles someone, follow more calmly (Bench, “calmer”), choose a scene of smaller depths, or cover the camera: the picture then only drifts, slowly.</li>
      <li><strong>People:</strong> tell guests that a camera looks into the room. Its pictures never leave the wall’s computer and are not kept.</li>
      <li><strong>Children:</strong> show pictures of children only as their parents agree, and not where strangers look in; ask the children too, once they are old enough.</li>
    </ul>
    <p>This is what is usual, not law: where local rules, the landlord or the makers’ papers ask for more or say otherwise, they hold. In doubt ask someone of the trade.</p>
  `,
  styles: 'ul { margin: 0; padding-left: 20px; display: grid; gap: 8px; } li { max-width: 68ch; } p { margin: 10px 0 0; max-width: 68ch; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Cautions {}
