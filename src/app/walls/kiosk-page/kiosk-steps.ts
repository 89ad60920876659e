/** One step of setting up the computer behind a wall: what to do and why, and what to type or to write into which file. */
export interface KioskStep {
  readonly title: string;
  readonly words: string;
  readonly blocks: readonly KioskBlock[];
}

export interface KioskBlock {
  /** Where it goes: a file's path, or null for commands. */
  readonly file: string | null;
  readonly text: string;
}

/** What of a wall and of this server the steps depend on. */
export interface KioskFacts {
  /** Where this server is reached, e.g. `https://oriel.local:8443`. */
  readonly origin: string;
  readonly upright: boolean;
}

const commands = (text: string): KioskBlock => ({ file: null, text });

const service = (start: string) => `[Unit]
Description=Oriel, the wall's picture
After=systemd-user-sessions.service
Conflicts=getty@tty1.service
After=getty@tty1.service

[Service]
User=wall
PAMName=login
TTYPath=/dev/tty1
TTYReset=yes
TTYVHangup=yes
StandardInput=tty-fail
UtmpIdentifier=tty1
UtmpMode=user
ExecStart=${start}
Restart=always
RestartSec=3

[Install]
WantedBy=graphical.target`;

const chromium = (origin: string) =>
  [
    '/usr/bin/chromium',
    '--kiosk',
    '--ozone-platform=wayland',
    '--no-first-run',
    '--noerrdialogs',
    '--disable-session-crashed-bubble',
    '--hide-crash-restore-bubble',
    '--disable-background-networking',
    '--autoplay-policy=no-user-gesture-required',
    '--password-store=basic',
    `${origin}/wall`,
  ].join(' \\\n  ');

const policy = (origin: string) =>
  JSON.stringify(
    {
      VideoCaptureAllowedUrls: [origin],
      AudioCaptureAllowed: false,
      DefaultNotificationsSetting: 2,
      PasswordManagerEnabled: false,
      TranslateEnabled: false,
      BrowserSignin: 0,
      MetricsReportingEnabled: false,
      DefaultBrowserSettingEnabled: false,
    },
    null,
    2,
  );

/**
 * A small Debian computer (12 “bookworm”, without a desktop) that starts straight into this wall: the compositor cage shows one program,
 * Chromium, and systemd starts it again whenever it ends. Names of packages were looked up in Debian 12 (cage 0.1.4, chromium,
 * libnss3-tools, v4l-utils, wlr-randr); options of cage were read in its manual page, the rest is common practice.
 */
export function kioskSteps({ origin, upright }: KioskFacts): KioskStep[] {
  const secure = origin.startsWith('https:');
  return [
    {
      title: 'Debian, without a desktop',
      words: 'Install Debian 12 and leave “desktop environment” out; keep “SSH server” and “standard system utilities”. Then install what the wall needs, and a user who may use screen and camera and has no password.',
      blocks: [
        commands(`sudo apt update
sudo apt install --no-install-recommends \\
  cage chromium chromium-sandbox libgl1-mesa-dri fonts-noto-core libpam-systemd v4l-utils${secure ? ' libnss3-tools' : ''}
sudo adduser --disabled-password --gecos "" wall
sudo usermod -aG video,render,input wall
sudo mkdir -p /etc/chromium/policies/managed /etc/systemd/system.conf.d`),
      ],
    },
    {
      title: 'The camera, allowed for this address alone',
      words: 'A managed policy lets this address use the camera without asking; nobody stands there to press “allow”. Check afterwards that the camera is there and what it delivers: 1280 × 720 at 30 a second is what following wants.',
      blocks: [
        { file: '/etc/chromium/policies/managed/oriel.json', text: policy(origin) },
        commands('v4l2-ctl --list-devices\nv4l2-ctl --list-formats-ext | grep -A3 1280x720'),
      ],
    },
    ...(secure ? [certificateStep(origin)] : [plainStep]),
    {
      title: 'Start by itself, and again whenever it ends',
      words: `cage draws no frame (-d)${upright ? ', turns the picture a quarter clockwise (-r; write -r -r -r for the other way)' : ''} and never blanks the screen. It does not wait for the network: once paired, the wall shows its scene without one.${upright ? ' From Debian 13 on cage has no -r: put “wlr-randr --output NAME --transform 90” before Chromium in a small script instead (package wlr-randr).' : ''}`,
      blocks: [
        { file: '/etc/systemd/system/oriel-wall.service', text: service(`/usr/bin/cage -d${upright ? ' -r' : ''} -- ${chromium(origin)}`) },
        commands(`sudo systemctl daemon-reload
sudo systemctl set-default graphical.target
sudo systemctl enable --now oriel-wall.service`),
      ],
    },
    {
      title: 'A watchdog, and no sleep',
      words: 'If the computer itself hangs, its hardware watchdog restarts it after 20 seconds; most boards have one. Masking the sleep targets keeps it awake.',
      blocks: [
        { file: '/etc/systemd/system.conf.d/watchdog.conf', text: '[Manager]\nRuntimeWatchdogSec=20s' },
        commands(`sudo systemctl mask sleep.target suspend.target hibernate.target hybrid-sleep.target
sudo systemctl reboot`),
      ],
    },
    {
      title: 'Pair it',
      words: 'After the restart the screen shows a code. Enter it at the desk within ten minutes, in the wall’s step Pair. To see what happens on the computer, read its journal.',
      blocks: [commands('journalctl -u oriel-wall.service -f')],
    },
  ];
}

function certificateStep(origin: string): KioskStep {
  const { hostname, port } = new URL(origin);
  return {
    title: 'The certificate, if it is home-made',
    words: 'Browsers give the camera only to https. If Oriel’s certificate comes from a public authority, skip this. If Oriel made its own, fetch it once over a network you trust, compare its fingerprint with the server’s, and trust it for this user. It is made anew after about a year: do this again then.',
    blocks: [
      commands(`openssl s_client -connect ${hostname}:${port || '443'} </dev/null | openssl x509 > oriel.pem
openssl x509 -in oriel.pem -noout -fingerprint -sha256
sudo install -o wall -g wall -m 644 oriel.pem ~wall/oriel.pem
sudo -iu wall mkdir -p .pki/nssdb
sudo -iu wall certutil -N -d sql:.pki/nssdb --empty-password
sudo -iu wall certutil -A -d sql:.pki/nssdb -t "P,," -n oriel -i oriel.pem`),
    ],
  };
}

const plainStep: KioskStep = {
  title: 'A secure address',
  words: 'Browsers give the camera only to https, or to an address on the same computer. This page was reached over plain http: that does if Oriel’s server runs on the wall’s own computer and the address is localhost. Otherwise reach Oriel over https and open this page again.',
  blocks: [],
};
