const entities = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" };
const escape = (text) => String(text ?? "").replace(/[&<>"]/g, (sign) => entities[sign]);

const style = `body{font:16px/1.5 system-ui,sans-serif;max-width:46rem;margin:2rem auto;padding:0 1rem;color:#1c2733;background:#fff}
code{font-size:.95em}h2{margin-top:2.5rem;border-top:1px solid #c8d0d8;padding-top:1rem}dt{font-weight:600;margin-top:.5rem}dd{margin-left:1.25rem}
a{color:#0f4c5c}@media (prefers-color-scheme:dark){body{color:#e6ebf0;background:#161b20}a{color:#8fd3e6}h2{border-color:#3b4753}}`;

/** The page that the functions' help links open: one section a function, from the metadata that Excel reads. */
export function helpPage({ functions }) {
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
<ul>
${functions.map(({ name }) => `<li><a href="#${anchor(name)}">FOOTING.${escape(name)}</a></li>`).join("\n")}
</ul>
${functions.map(section).join("\n")}
</main>
</body>
</html>
`;
}

const anchor = (name) => escape(name.toLowerCase());

function section({ name, description, parameters }) {
  const parameterNames = parameters.map((parameter) => (parameter.optional ? `[${parameter.name}]` : parameter.name));
  const list = parameters.map(
    ({ name: parameter, description: meaning }) => `<dt>${escape(parameter)}</dt><dd>${escape(meaning)}</dd>`,
  );
  return `<section id="${anchor(name)}">
<h2>FOOTING.${escape(name)}</h2>
<p><code>=FOOTING.${escape(name)}(${escape(parameterNames.join(", "))})</code></p>
<p>${escape(description)}</p>
<dl>
${list.join("\n")}
</dl>
</section>`;
}
