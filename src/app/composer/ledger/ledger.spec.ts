import { provideZonelessChangeDetection } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { layerIds, someScene } from '@oriel/shared/contracts/testing/some-scene';
import { setDepth } from '../commands/layer-commands';
import { SceneStore } from '../scene-store';
import { Viewer } from '../walk/viewer';
import { Ledger } from './ledger';
import { RoomFigures } from './room-figures';

describe('the ledger', () => {
  let fixture: ComponentFixture<Ledger>;
  let store: SceneStore;
  const element = () => fixture.nativeElement as HTMLElement;
  const rows = () => [...element().querySelectorAll('li')].map((row) => row.querySelector('.name span')?.textContent);
  const field = (label: string) => {
    const found = [...element().querySelectorAll('label')].find((one) => one.textContent.trim() === label);
    return element().querySelector<HTMLInputElement>(`#${found?.htmlFor}`)!;
  };
  const type = async (label: string, text: string) => {
    const input = field(label);
    input.value = text;
    input.dispatchEvent(new Event('input'));
    input.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
    await fixture.whenStable();
  };

  beforeEach(async () => {
    TestBed.configureTestingModule({ imports: [Ledger], providers: [provideZonelessChangeDetection(), SceneStore, RoomFigures, Viewer] });
    store = TestBed.inject(SceneStore);
    store.open(someScene);
    fixture = TestBed.createComponent(Ledger);
    await fixture.whenStable();
  });

  it('lists the farthest first, with depth and bleed', () => {
    expect(rows()).toEqual(['Sky', 'Larches', 'Meadow']);
    expect(field('Depth of Meadow').value).toBe('\u221260');
    expect(element().querySelector('.bleed')?.textContent).toContain('short');
  });

  it('takes a depth as it is typed and moves the row to its place', async () => {
    await type('Depth of Meadow', '1000 mm');
    expect(rows()).toEqual(['Meadow', 'Sky', 'Larches']);
    expect(store.document().layers[2].depthMm).toBe(1000);
  });

  it('keeps what it cannot read, says why, and goes back on Escape', async () => {
    await type('Depth of Sky', 'far');
    expect(element().querySelector('[role=alert]')?.textContent).toBe('Write a figure, such as 180');
    expect(field('Depth of Sky').value).toBe('far');
    await type('Depth of Sky', '-5000');
    expect(element().querySelector('[role=alert]')?.textContent).toContain('At least \u22121100 mm');
    field('Depth of Sky').dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape' }));
    await fixture.whenStable();
    expect(field('Depth of Sky').value).toBe('+900');
    expect(store.document()).toBe(someScene);
  });

  it('goes back on Escape even where the refused field was left, and when the figure is changed elsewhere', async () => {
    await type('Depth of Sky', '-5000');
    field('Depth of Sky').dispatchEvent(new Event('blur'));
    await fixture.whenStable();
    expect(field('Depth of Sky').value).toBe('-5000');
    document.dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape' }));
    await fixture.whenStable();
    expect(field('Depth of Sky').value).toBe('+900');
    expect(element().querySelector('[role=alert]')).toBeNull();

    await type('Depth of Sky', '-5000');
    store.edit(setDepth(layerIds[0], 450));
    await fixture.whenStable();
    expect(field('Depth of Sky').value).toBe('+450');
    expect(element().querySelector('[role=alert]')).toBeNull();
  });

  it('says what its words mean when asked, and stops on Escape', async () => {
    const word = [...element().querySelectorAll<HTMLButtonElement>('oriel-term button')].find((one) => one.textContent.includes('Bleed'))!;
    word.click();
    await fixture.whenStable();
    expect(word.getAttribute('aria-expanded')).toBe('true');
    expect(document.getElementById(word.getAttribute('aria-describedby') ?? '')?.textContent).toContain('to spare beyond the glass');
    document.body.dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape', keyCode: 27, bubbles: true }));
    await fixture.whenStable();
    expect(word.getAttribute('aria-expanded')).toBe('false');
  });

  it('says how far the selected layer moves: 1200 mm of zone at 900 mm behind from 1800 mm is 400 mm, 640 px of 1920 (computed)', async () => {
    store.select(layerIds[0]);
    await fixture.whenStable();
    expect(element().querySelector('.moves')?.textContent.replace(/\s+/g, ' ')).toContain(
      'Sky moves 400 mm on the glass from one end of the viewing zone to the other, 640 px of 1920.',
    );
  });

  it('shows figures only to those who may only look', async () => {
    store.readOnly.set(true);
    store.select(layerIds[0]);
    await fixture.whenStable();
    expect(element().textContent).not.toContain('Add layers');
    expect(field('Depth of Sky').readOnly).toBe(true);
    expect(element().querySelector('[aria-label=Remove]')).toBeNull();
  });
});
