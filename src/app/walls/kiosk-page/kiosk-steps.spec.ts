import { kioskSteps } from './kiosk-steps';

const all = (facts: Parameters<typeof kioskSteps>[0]) => kioskSteps(facts).flatMap(({ blocks }) => blocks);
const file = (path: string, facts: Parameters<typeof kioskSteps>[0]) => all(facts).find((block) => block.file === path)!.text;
const facts = { origin: 'https://oriel.local:8443', upright: false };

describe('the steps to a kiosk', () => {
  it('allow the camera for this origin and no other', () => {
    expect(JSON.parse(file('/etc/chromium/policies/managed/oriel.json', facts))).toMatchObject({ VideoCaptureAllowedUrls: ['https://oriel.local:8443'], AudioCaptureAllowed: false });
  });

  it('start Chromium on the wall’s own page, again whenever it ends', () => {
    const unit = file('/etc/systemd/system/oriel-wall.service', facts);
    expect(unit).toContain('--kiosk');
    expect(unit).toContain('https://oriel.local:8443/wall');
    expect(unit).toMatch(/^Restart=always$/m);
    expect(unit).not.toContain('cage -d -r');
  });

  it('turn the picture of a glass that hangs upright', () => {
    expect(file('/etc/systemd/system/oriel-wall.service', { ...facts, upright: true })).toContain('cage -d -r -- ');
  });

  it('trust a home-made certificate only where there is one', () => {
    const text = (origin: string) => all({ ...facts, origin }).map((block) => block.text).join('\n');
    expect(text('https://oriel.local:8443')).toContain('-connect oriel.local:8443');
    expect(text('https://oriel.example')).toContain('-connect oriel.example:443');
    expect(text('http://localhost:3000')).not.toContain('certutil');
  });
});
