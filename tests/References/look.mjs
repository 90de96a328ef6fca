// Looks at pages in a browser: node look.mjs CHROMIUM FOLDER NAME... reads FOLDER/NAME.html, leaves its pictures and its print beside it, and prints a line of JSON for each look.
import { readFile, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import { chromium } from 'playwright-core'

const [executablePath, folder, ...names] = process.argv.slice(2)
const axe = await readFile(new URL('node_modules/axe-core/axe.min.js', import.meta.url), 'utf8')
const sizes = { phone: { width: 360, height: 740 }, desk: { width: 1200, height: 900 } }

const browser = await chromium.launch({
  executablePath,
  args: ['--no-sandbox', '--disable-gpu', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'],
})

for (const name of names) {
  for (const [size, viewport] of Object.entries(sizes)) {
    const context = await browser.newContext({ viewport, offline: true, bypassCSP: true })
    const page = await context.newPage()
    await page.goto(pathToFileURL(join(folder, `${name}.html`)).href)
    for (const colorScheme of ['light', 'dark']) {
      await page.emulateMedia({ colorScheme, media: 'screen' })
      const seen = { page: name, size, colours: colorScheme, ...await page.evaluate(look), faults: await faults(page) }
      await page.screenshot({ path: join(folder, `${name}-${size}-${colorScheme}.png`), fullPage: true })
      console.log(JSON.stringify(seen))
    }
    if (size === 'desk') {
      await page.emulateMedia({ colorScheme: 'light', media: 'print' })
      const print = await page.pdf({ format: 'A4', preferCSSPageSize: true })
      await writeFile(join(folder, `${name}.pdf`), print)
      console.log(JSON.stringify({ page: name, size: 'paper', sheets: print.toString('latin1').match(/\/Type\s*\/Page\b/g)?.length ?? 0 }))
    }
    await context.close()
  }
}
await browser.close()

// What axe-core calls serious or critical.
async function faults(page) {
  await page.evaluate(axe)
  const { violations } = await page.evaluate(() => globalThis.axe.run(document, { resultTypes: ['violations'] }))
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) => nodes.map(node => `${id}: ${node.html.slice(0, 160)}`))
}

// Runs in the page.
function look() {
  const root = document.documentElement
  const beyond = [...document.body.querySelectorAll('*')].filter(part => !part.closest('.heard') && part.getBoundingClientRect().right > root.clientWidth + 0.5)
  const pictures = [...document.querySelectorAll('figure svg, img')].map(picture => {
    const place = picture.getBoundingClientRect()
    return { words: picture.getAttribute('aria-label') ?? picture.alt, width: place.width, height: place.height, drawn: picture.naturalWidth ?? picture.querySelectorAll('rect').length }
  })
  const style = getComputedStyle(root)
  return {
    width: root.clientWidth,
    scrolled: root.scrollWidth,
    beyond: beyond.slice(0, 5).map(part => part.outerHTML.slice(0, 120)),
    pictures,
    paper: getComputedStyle(document.body).backgroundColor === 'rgba(0, 0, 0, 0)' ? style.backgroundColor : getComputedStyle(document.body).backgroundColor,
    smallest: Math.min(...[...document.querySelectorAll('p, li, td, th, figcaption')].map(part => parseFloat(getComputedStyle(part).fontSize))),
  }
}
