// Imported first by every command: the rest needs a Node that has what it uses.
const [major, minor] = process.versions.node.split('.').map(Number)
const wanted = { major: 20, minor: 19 }

if (major < wanted.major || (major === wanted.major && minor < wanted.minor)) {
  console.error(
    `Node ${process.versions.node} is too old: Turnstone needs Node ${wanted.major}.${wanted.minor} or newer.`,
  )
  process.exit(1)
}
