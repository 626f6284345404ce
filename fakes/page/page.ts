import { resolve } from 'node:path'
import escapeHtml from 'escape-html'
import { Router, static as files } from 'express'
import helmet from 'helmet'

/** Text that is markup already and must not be escaped again. */
export class Html {
  constructor(readonly text: string) {}
  toString() {
    return this.text
  }
}

type Part = string | number | Html | Part[] | undefined

function render(part: Part): string {
  if (part === undefined) return ''
  if (Array.isArray(part)) return part.map(render).join('')
  return part instanceof Html ? part.text : escapeHtml(String(part))
}

/** Markup from a template; everything put into it is escaped unless it is markup itself. */
export function html(strings: TemplateStringsArray, ...parts: Part[]): Html {
  return new Html(strings.reduce((text, string, at) => text + render(parts[at - 1]) + string))
}

/**
 * A whole page of a stand-in.
 *
 * @param title of the page, without the name of the product
 * @param note what the stand-in is for, said on top of every page
 * @param head more for the head, such as a script file
 */
export function page({ title, note, body, head }: { title: string; note: string; body: Html; head?: Html }) {
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${title} · Evenrule</title>
        <link rel="icon" href="data:," />
        <link rel="stylesheet" href="/page.css" />
        ${head}
      </head>
      <body>
        <header class="stand-in"><p>${note}</p></header>
        <main>${body}</main>
      </body>
    </html>`.text
}

/**
 * Headers, stylesheet and fonts of the pages.
 *
 * @param formTargets origins that a form of these pages may lead to, by way of redirects too
 */
export function pageAssets(formTargets: string[] = []) {
  const root = process.env.EVENRULE_ROOT ?? process.cwd()
  const router = Router()
  router.use(
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'none'"],
          styleSrc: ["'self'"],
          fontSrc: ["'self'"],
          imgSrc: ['data:'],
          scriptSrc: ["'self'"],
          formAction: ["'self'", ...formTargets],
          baseUri: ["'none'"],
          frameAncestors: ["'none'"],
        },
      },
      referrerPolicy: { policy: 'same-origin' },
      strictTransportSecurity: false,
    }),
  )
  router.get('/page.css', (_request, response) => response.sendFile('fakes/page/page.css', { root }))
  router.use('/fonts', files(resolve(root, 'node_modules/@fontsource/noto-sans/files'), { index: false }))
  return router
}
