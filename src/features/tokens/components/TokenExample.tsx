import { useState } from 'react';
import { CopyButton } from '../../../components/CopyButton.tsx';
import { Tabs } from '../../../components/Tabs.tsx';

const body = `{"cases": [{
  "wavelengthNm": 632.8, "angleDeg": 60,
  "incident": {"index": 1},
  "layers": [{"thicknessNm": 10, "index": [2.87, 3.36],
              "voigt": [0.0376, 0.0066], "m": [0, 0, 1]}],
  "substrate": {"index": [3.88, 0.02]}
}]}`;

type Language = 'curl' | 'node' | 'python';
const languages: readonly { value: Language; label: string }[] = [
  { value: 'curl', label: 'curl' },
  { value: 'node', label: 'Node' },
  { value: 'python', label: 'Python' },
];

/** The same call in three languages, each with nothing but what the language brings. */
function exampleFor(language: Language, origin: string): string {
  const url = `${origin}/api/v1/solve`;
  switch (language) {
    case 'curl':
      return `curl -s ${url} \\
  -H "Authorization: Bearer $SKEWLIGHT_TOKEN" \\
  -H "Content-Type: application/json" \\
  -d '${body}'`;
    case 'node':
      return `const cases = ${body};
const response = await fetch('${url}', {
  method: 'POST',
  headers: {
    Authorization: \`Bearer \${process.env.SKEWLIGHT_TOKEN}\`,
    'Content-Type': 'application/json',
  },
  body: JSON.stringify(cases),
});
const { results } = await response.json();
console.log(results[0].points[0].kerr.p);`;
    case 'python':
      return `import json, os, urllib.request

cases = ${body}
request = urllib.request.Request(
    "${url}",
    data=json.dumps(cases).encode(),
    headers={"Authorization": "Bearer " + os.environ["SKEWLIGHT_TOKEN"],
             "Content-Type": "application/json"})
with urllib.request.urlopen(request) as response:
    answer = json.load(response)
print(answer["results"][0]["points"][0]["kerr"]["p"])`;
  }
}

export function TokenExample() {
  const [language, setLanguage] = useState<Language>('curl');
  const example = exampleFor(language, window.location.origin);
  return (
    <Tabs
      label="Language of the example"
      value={language}
      onValueChange={setLanguage}
      tabs={languages}
      end={<CopyButton text={example} what="example" />}
    >
      <pre
        tabIndex={0}
        aria-label="Example"
        className="card mt-2 overflow-x-auto p-4 text-note leading-relaxed"
      >
        {example}
      </pre>
    </Tabs>
  );
}
