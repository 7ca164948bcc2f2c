import { existsSync } from 'node:fs'
import { capture, must } from './command.mjs'
import { asRoot } from './places.mjs'
import { newestVersion } from './postgres-versions.mjs'
import { Stop } from './steps.mjs'

/** The Debian packages a command may need, and how to see that one is there. */
const present = {
  postgresql: () => newestVersion() !== undefined,
  chromium: () => existsSync('/usr/bin/chromium'),
}

/**
 * Installs the Debian packages that are missing.
 *
 * @param {(keyof typeof present)[]} names
 * @returns {Promise<string>} what was found or done
 * @throws {Stop} with the exact command, where it may not install
 */
export async function ensurePackages(names) {
  const missing = names.filter((name) => !present[name]())
  if (missing.length === 0) return 'present'
  const install = ['apt-get', 'install', '--yes', '--no-install-recommends', ...missing]
  const byHand = `sudo ${install.join(' ')}`
  if (!existsSync('/usr/bin/apt-get'))
    throw new Stop(`Missing: ${missing.join(', ')}. This is not Debian: install by hand.`)
  const mayInstall = asRoot || (await capture(['sudo', '-n', 'true'])).code === 0
  if (!mayInstall) throw new Stop(`Missing Debian packages. Install them with: ${byHand}`)
  // RUNLEVEL=1 keeps Debian from starting a database server of its own after the installation.
  const rights = [...(asRoot ? [] : ['sudo', '-n']), 'env', 'DEBIAN_FRONTEND=noninteractive', 'RUNLEVEL=1']
  await must('The list of Debian packages could not be fetched.', [...rights, 'apt-get', 'update'], { log: 'apt' })
  await must(`Debian packages could not be installed. Try by hand: ${byHand}`, [...rights, ...install], { log: 'apt' })
  const still = missing.filter((name) => !present[name]())
  if (still.length > 0) throw new Stop(`Installed, yet not found: ${still.join(', ')}.`)
  return `installed ${missing.join(', ')}`
}
