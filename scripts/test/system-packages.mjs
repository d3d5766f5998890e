import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';

/** Debian packages that some checks need; `present` tells without apt whether they are there. */
const needed = [
  {
    name: 'chromium',
    checks: 'browser journeys, accessibility and widths',
    present: () => existsSync('/usr/bin/chromium'),
  },
  {
    name: 'python3-scipy',
    checks: 'the recorder against SciPy on a real ECG record',
    present: () => succeeds('/usr/bin/python3', ['-c', 'import scipy.signal, scipy.misc']),
  },
  {
    name: 'python3-mne',
    checks: 'EDF+ files read back',
    present: () => succeeds('/usr/bin/python3', ['-c', 'import mne']),
  },
  {
    name: 'libedf1',
    checks: 'EDF+ files under a strict reader',
    present: () => succeeds('/usr/bin/python3', ['-c', "import ctypes; ctypes.CDLL('libedf.so.1')"]),
  },
  {
    name: 'biosig-tools',
    checks: 'EDF+ and aECG files under a second reader',
    present: () => existsSync('/usr/bin/save2gdf'),
  },
  {
    name: 'python3-pydicom',
    checks: 'DICOM waveforms read back',
    present: () => succeeds('/usr/bin/python3', ['-c', 'import pydicom']),
  },
  { name: 'dcmtk', checks: 'DICOM files under a reader', present: () => existsSync('/usr/bin/dcmftest') },
  {
    name: 'dicom3tools',
    checks: 'DICOM files under a validator',
    present: () => existsSync('/usr/bin/dciodvfy'),
  },
  {
    name: 'libxml2-utils',
    checks: 'aECG and SVG files under an XML parser',
    present: () => existsSync('/usr/bin/xmllint'),
  },
  {
    name: 'poppler-utils',
    checks: 'PDF sheets measured as painted',
    present: () => existsSync('/usr/bin/pdftoppm'),
  },
  { name: 'qpdf', checks: 'PDF sheets checked for soundness', present: () => existsSync('/usr/bin/qpdf') },
  { name: 'sox', checks: 'WAV files read back', present: () => existsSync('/usr/bin/sox') },
];

function succeeds(command, args) {
  return spawnSync(command, args, { stdio: 'ignore' }).status === 0;
}

/** How apt-get can be run here: as root, through sudo without a password, or not at all. */
function aptPrefix() {
  if (!succeeds('apt-get', ['--version'])) return null;
  if (process.getuid?.() === 0) return [];
  return succeeds('sudo', ['-n', 'true']) ? ['sudo', '-n'] : null;
}

function runApt(prefix, args) {
  const [command, ...rest] = [...prefix, 'apt-get', ...args];
  return spawnSync(command, rest, {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
  }).status;
}

/** Installs what is missing where apt allows it; returns what is still missing. */
export function ensureSystemPackages() {
  const missing = needed.filter((one) => !one.present());
  const prefix = missing.length > 0 ? aptPrefix() : null;
  if (prefix) {
    const names = missing.map((one) => one.name);
    console.log(`Installing Debian packages: ${names.join(', ')} …`);
    runApt(prefix, ['update', '-qq']);
    runApt(prefix, ['install', '-y', '-qq', '--no-install-recommends', ...names]);
  }
  return missing.filter((one) => !one.present());
}
