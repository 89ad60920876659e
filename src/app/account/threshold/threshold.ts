import { ChangeDetectionStrategy, Component, type ElementRef, inject, resource, viewChild } from '@angular/core';
import { SceneView } from '../../scene-view/scene-view';
import { WelcomeScene } from './welcome-scene';

/** The frame of every page before signing in: the words on the left, and a window onto a scene that follows the pointer. */
@Component({
  selector: 'oriel-threshold',
  imports: [SceneView],
  templateUrl: './threshold.html',
  styleUrl: './threshold.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(pointermove)': 'look($event)' },
})
export class Threshold {
  private readonly welcome = inject(WelcomeScene);
  private readonly host = viewChild.required<ElementRef<HTMLElement>>('frame');
  private readonly view = viewChild(SceneView);
  protected readonly scene = resource({ loader: () => this.welcome.load() });

  protected look(event: PointerEvent): void {
    const box = this.host().nativeElement.getBoundingClientRect();
    this.view()?.lookFrom(event.clientX / box.width, event.clientY / box.height);
  }
}
