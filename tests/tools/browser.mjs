import { execFileSync } from 'node:child_process';
import { accessSync, constants, existsSync, readdirSync, statSync } from 'node:fs';
import { homedir } from 'node:os';
import { delimiter, join } from 'node:path';
import process from 'node:process';

/**
 * Finds the browsers that the checks run in. A path in `CHROME_PATH` or `FIREFOX_PATH` is taken as
 * it is; then the usual places of the system are tried, then browsers that playwright downloaded.
 */

const { env, platform } = process;

/** Whether a path names a file that this user may run. */
function isProgram(path) {
  try {
    accessSync(path, constants.X_OK);
    return statSync(path).isFile();
  } catch {
    return false;
  }
}

/** The program in the search path under one of the names, or undefined. */
function inSearchPath(names) {
  const folders = (env.PATH ?? '').split(delimiter).filter(Boolean);
  const suffixes = platform === 'win32' ? ['.exe'] : [''];
  return folders
    .flatMap((folder) => names.flatMap((name) => suffixes.map((suffix) => join(folder, name + suffix))))
    .find(isProgram);
}

/** Places of an application on macOS (for all users, for this user) or Windows (per programs folder). */
function installed(macApplication, windowsProgram) {
  if (platform === 'darwin') {
    return ['/Applications', join(homedir(), 'Applications')].map((folder) => join(folder, macApplication));
  }
  if (platform === 'win32') {
    const folders = [env.PROGRAMFILES, env['PROGRAMFILES(X86)'], env.LOCALAPPDATA].filter(Boolean);
    return folders.map((folder) => join(folder, windowsProgram));
  }
  return [];
}

/** Where playwright keeps the browsers it downloads. */
function downloadFolder() {
  if (env.PLAYWRIGHT_BROWSERS_PATH && env.PLAYWRIGHT_BROWSERS_PATH !== '0')
    return env.PLAYWRIGHT_BROWSERS_PATH;
  if (platform === 'darwin') return join(homedir(), 'Library', 'Caches', 'ms-playwright');
  if (platform === 'win32')
    return join(env.LOCALAPPDATA ?? join(homedir(), 'AppData', 'Local'), 'ms-playwright');
  return join(env.XDG_CACHE_HOME ?? join(homedir(), '.cache'), 'ms-playwright');
}

/** The newest downloaded browser whose folder starts with `prefix`, at one of the places inside it. */
function downloaded(prefix, places) {
  const folder = downloadFolder();
  if (!existsSync(folder)) return undefined;
  const revision = (name) => Number(name.split('-').at(-1));
  return readdirSync(folder)
    .filter((name) => name.startsWith(prefix))
    .sort((first, second) => revision(second) - revision(first))
    .flatMap((name) => places.map((place) => join(folder, name, place)))
    .find(isProgram);
}

/** A path from the environment, which must be right if it is given. */
function named(variable) {
  const path = env[variable];
  if (!path) return undefined;
  if (!isProgram(path)) {
    throw new Error(`${variable} is ${path}, but there is no program. Mend the path or unset it.`);
  }
  return path;
}

/** Path of a Chromium or Chrome, or undefined where there is none. */
export function findChromium() {
  return (
    named('CHROME_PATH') ??
    inSearchPath(['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable', 'chrome']) ??
    [
      ...installed('Chromium.app/Contents/MacOS/Chromium', 'Chromium/Application/chrome.exe'),
      ...installed('Google Chrome.app/Contents/MacOS/Google Chrome', 'Google/Chrome/Application/chrome.exe'),
    ].find(isProgram) ??
    downloaded('chromium-', [
      'chrome-linux64/chrome',
      'chrome-linux/chrome',
      'chrome-mac/Chromium.app/Contents/MacOS/Chromium',
      'chrome-win/chrome.exe',
      'chrome-win64/chrome.exe',
    ])
  );
}

/** Path of a Firefox, or undefined where there is none. */
export function findFirefox() {
  return (
    named('FIREFOX_PATH') ??
    inSearchPath(['firefox', 'firefox-esr']) ??
    installed('Firefox.app/Contents/MacOS/firefox', 'Mozilla Firefox/firefox.exe').find(isProgram) ??
    downloaded('firefox-', [
      'firefox/firefox',
      'firefox/Nightly.app/Contents/MacOS/firefox',
      'firefox/firefox.exe',
    ])
  );
}

/** Whether packages can be installed without asking anybody: Debian or a child of it, as root. */
function canInstall() {
  return process.getuid?.() === 0 && inSearchPath(['apt-get']) !== undefined;
}

function install(name) {
  console.log(`No browser found; installing ${name} …`);
  const options = {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...env, DEBIAN_FRONTEND: 'noninteractive' },
  };
  execFileSync('apt-get', ['update', '-qq'], options);
  execFileSync('apt-get', ['install', '-y', '-qq', '--no-install-recommends', name], options);
}

/**
 * Path of a Chromium or Chrome; on Debian as root it is installed where there is none.
 *
 * @throws Error saying what to do, where there is none and none can be installed.
 */
export async function ensureChromium() {
  const found = findChromium();
  if (found !== undefined) return found;
  if (canInstall()) {
    try {
      install('chromium');
    } catch (error) {
      throw new Error(`Chromium could not be installed with apt-get: ${error.message}`);
    }
    const path = findChromium();
    if (path !== undefined) return path;
  }
  throw new Error(
    'These checks need Chromium or Chrome, and none was found. Install one (on Debian: ' +
      '`apt-get install chromium`), or set CHROME_PATH to the program, and run them again.',
  );
}
