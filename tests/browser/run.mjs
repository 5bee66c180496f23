// Opens finished HTML reports in a headless browser and fails on anything that a reader would stumble over:
// accessibility faults (axe-core, WCAG 2.2 AA and best practices) in light and dark, wide and narrow; network requests; scripts; console errors;
// content wider than the page.
//
//   node run.mjs [--shots FOLDER] REPORT.html ...
//
// Without files it checks every report.html under recipes/ and tests/golden/. CHROMIUM names the browser when it is not /usr/bin/chromium.
import { existsSync, mkdirSync, readFileSync, readdirSync } from "node:fs";
import { basename, dirname, join, relative, resolve } from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";
import { AxeBuilder } from "@axe-core/playwright";
import { chromium } from "playwright-core";

const root = resolve(dirname(fileURLToPath(import.meta.url)), "../..");
const args = process.argv.slice(2);
let shots = null;
const files = [];
while (args.length > 0) {
  const arg = args.shift();
  if (arg === "--shots") {
    shots = args.shift();
  } else {
    files.push(resolve(arg));
  }
}
if (files.length === 0) {
  files.push(...["recipes", "tests/golden"].flatMap((folder) => reportsUnder(join(root, folder))));
}
if (files.length === 0) {
  console.error("no report.html found; name one");
  process.exit(64);
}
if (shots) {
  mkdirSync(shots, { recursive: true });
}

const views = [
  { name: "light-wide", colorScheme: "light", width: 1440 },
  { name: "dark-narrow", colorScheme: "dark", width: 390 },
];
const browser = await chromium.launch({
  executablePath: process.env.CHROMIUM ?? "/usr/bin/chromium",
  args: [
    "--no-sandbox",
    "--disable-gpu",
    "--disable-quic",
    "--no-first-run",
    "--disable-background-networking",
    "--disable-component-update",
    "--disable-sync",
  ],
});
let passed = 0;
let failed = 0;
try {
  for (const file of files) {
    for (const view of views) {
      const faults = await check(file, view);
      const name = `${relative(root, file)} (${view.name})`;
      if (faults.length === 0) {
        passed++;
        console.log(`ok      ${name}`);
      } else {
        failed++;
        console.log(`FAILED  ${name}`);
        faults.forEach((fault) => console.log(`        ${fault}`));
      }
    }
  }
} finally {
  await browser.close();
}
console.log(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);

async function check(file, view) {
  const faults = [];
  const context = await browser.newContext({
    colorScheme: view.colorScheme,
    viewport: { width: view.width, height: 1000 },
  });
  const page = await context.newPage();
  const own = pathToFileURL(file).href;
  page.on("request", (request) => {
    const url = request.url();
    if (url !== own && !url.startsWith("data:")) {
      faults.push(`asks for ${url}`);
    }
  });
  page.on("console", (message) => {
    if (message.type() === "error") {
      faults.push(`console: ${message.text()}`);
    }
  });
  await page.goto(own);
  if (/<script/i.test(readFileSync(file, "utf8"))) {
    faults.push("holds a script");
  }
  const overflow = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  if (overflow > 0) {
    faults.push(`is ${overflow} px wider than its window`);
  }
  const dead = await page.evaluate(() =>
    [...document.querySelectorAll('a[href^="#"]')]
      .map((a) => a.getAttribute("href"))
      .filter((href) => !document.getElementById(decodeURIComponent(href.slice(1)))),
  );
  dead.forEach((href) => faults.push(`the link ${href} leads nowhere`));
  const result = await new AxeBuilder({ page })
    .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"])
    .analyze();
  for (const violation of result.violations) {
    faults.push(`${violation.id}: ${violation.help} (${violation.nodes.length}; first: ${violation.nodes[0].html.slice(0, 120)})`);
  }
  if (shots) {
    const stem = join(shots, `${basename(dirname(file))}-${basename(file, ".html")}`);
    await page.screenshot({ path: `${stem}-${view.name}.png`, fullPage: true });
    if (view.name === "light-wide") {
      await page.emulateMedia({ media: "print" });
      await page.pdf({ path: `${stem}.pdf`, preferCSSPageSize: true, printBackground: true });
    }
  }
  await context.close();
  return faults;
}

function reportsUnder(folder) {
  if (!existsSync(folder)) {
    return [];
  }
  return readdirSync(folder, { recursive: true })
    .filter((name) => basename(name) === "report.html")
    .sort()
    .map((name) => join(folder, name));
}
