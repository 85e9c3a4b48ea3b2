const entities = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" };
const escape = (text) => String(text ?? "").replace(/[&<>"]/g, (sign) => entities[sign]);

const style = `body{font:16px/1.5 system-ui,sans-serif;max-width:46rem;margin:2rem auto;padding:0 1rem;color:#1c2733;background:#fff}
h1{font-size:1.6rem;line-height:1.25}h2{margin-top:2.5rem;border-top:1px solid #c8d0d8;padding-top:1rem;font-size:1.2rem}
code{font-size:.95em;overflow-wrap:anywhere}dt{font-weight:600;margin-top:.5rem}dd{margin-left:1.25rem}
ul.functions{columns:14rem;padding:0;list-style:none}
a{color:#0f4c5c}a:focus-visible{outline:2px solid;outline-offset:2px}
@media (prefers-color-scheme:dark){body{color:#e6ebf0;background:#161b20}a{color:#8fd3e6}h2{border-color:#3b4753}}`;

/** The page that the functions' help links open: one section a function, then what holds for all of them. */
export function helpPage({ functions, settings, signs, notes }) {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Footing: worksheet functions</title>
<style>${style}</style>
</head>
<body>
<main>
<h1>Footing: worksheet functions</h1>
<p>Each function is written with the prefix FOOTING and a dot. They compute on this computer and send nothing anywhere.</p>
<ul class="functions">
${functions.map(({ id }) => `<li><a href="#${anchor(id)}">FOOTING.${escape(id)}</a></li>`).join("\n")}
</ul>
<p><a href="#every-setting">Every setting</a>, <a href="#signs">signs in the place of a value</a>, and ${noteLinks(notes)}.</p>
${functions.map(section).join("\n")}
${settingsSection(settings)}
${signsSection(signs)}
${notes.map(noteSection).join("\n")}
</main>
</body>
</html>
`;
}

const anchor = (name) => escape(name.toLowerCase().replace(/[^a-z0-9]+/g, "-"));

function section({ id, call, description, gives, parameters }) {
  const list = parameters.map(
    ({ name: parameter, description: meaning }) => `<dt>${escape(parameter)}</dt><dd>${escape(meaning)}</dd>`,
  );
  return `<section id="${anchor(id)}">
<h2>FOOTING.${escape(id)}</h2>
<p><code>${escape(call)}</code></p>
<p>${escape(description)}</p>
<p>Gives: ${escape(gives)}</p>
${list.length === 0 ? "" : `<dl>\n${list.join("\n")}\n</dl>`}
</section>`;
}

function settingsSection(settings) {
  const list = settings.map(
    ({ name, values, standard, meaning }) =>
      `<dt>${escape(name)}</dt><dd>${escape(meaning)}<br>Values: ${escape(values)}. When left out: ${escape(standard)}.</dd>`,
  );
  return `<section id="every-setting">
<h2>Every setting</h2>
<p>As two columns of names and values, or as a text: <code>"rows: time; lags: 4"</code>.</p>
<dl>
${list.join("\n")}
</dl>
</section>`;
}

const signsSection = (signs) => `<section id="signs">
<h2>Signs in the place of a value</h2>
<dl>
${signs.map(([sign, meaning]) => `<dt>${escape(sign)}</dt><dd>${escape(meaning)}</dd>`).join("\n")}
</dl>
</section>`;

const noteLinks = (notes) =>
  notes.map(([heading]) => `<a href="#${anchor(heading)}">${escape(heading.toLowerCase())}</a>`).join(", ");

const noteSection = ([heading, words]) => `<section id="${anchor(heading)}">
<h2>${escape(heading)}</h2>
<p>${escape(words)}</p>
</section>`;
