import { escape } from './escape';
import { RACK_REFUSALS, RACK_STEPS } from './rack-example';

function block(label: string, text: string): string {
  return `<pre tabindex="0" aria-label="${escape(label)}"><code>${escape(text)}</code></pre>`;
}

/** The conversation of a test rack, to be followed with curl. */
export function rackSection(): string {
  const steps = RACK_STEPS.map(
    ({ about, typed, answer }, index) =>
      `<li><p>${escape(about)}</p>${block(`Step ${index + 1}, typed`, typed)}${
        answer === undefined ? '' : `<p>The answer:</p>${block(`Step ${index + 1}, answer`, answer)}`
      }</li>`,
  );
  const refusals = RACK_REFUSALS.map(
    ({ status, means }) => `<tr><th scope="row">${status}</th><td>${escape(means)}</td></tr>`,
  );
  return `<section><h2 id="test-rack">A test rack, step by step</h2><ol>${steps.join('\n')}</ol>
<div class="frame" tabindex="0"><table><caption>What a refusal means</caption><tbody>${refusals.join('')}</tbody></table></div></section>`;
}
