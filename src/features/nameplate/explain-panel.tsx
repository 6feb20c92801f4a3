import { caseLetter } from '#shared/circuit/edit/cases.ts';
import { CaseLetter } from '#src/components/case-letter.tsx';
import { SheetDialog } from '#src/components/dialog.tsx';
import { PhraseText } from '#src/components/quantity.tsx';
import { useFormat } from '#src/components/use-format.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useExplain } from '#src/stores/explain-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { type Explained, type ExplainInput, explanationOf } from './explanation.ts';

/** "How is this computed?": equation, inputs with their sources, assumptions, limits. */
export function ExplainPanel() {
  const address = useExplain((state) => state.address);
  const close = useExplain((state) => state.close);
  const caseOf = useExplain((state) => state.caseId);
  const document = useDocument((state) => state.document);
  const activeCase = useDocument((state) => state.activeCase);
  const caseId = caseOf ?? activeCase;
  const result = useRuns((state) => state.byCase[caseId]);
  const time = useCursor((state) => state.time);
  if (address === null) return null;
  const entry = document.cases.find((candidate) => candidate.id === caseId);
  const explained = explanationOf({ document, caseId, run: result?.run ?? null, assessment: result?.assessment ?? null, time }, address);
  return (
    <SheetDialog title="How is this computed?" onClose={close}>
      {entry && (
        <p className="explain-case">
          <CaseLetter letter={caseLetter(entry)} ink={entry.ink} size={20} label="Case" /> {entry.name}
        </p>
      )}
      {explained ? (
        <Explanation explained={explained} />
      ) : (
        <p>There is nothing under this address any more: {address}. Run the case again.</p>
      )}
    </SheetDialog>
  );
}

function Explanation({ explained }: { readonly explained: Explained }) {
  const { words } = useFormat();
  return (
    <>
      <h3 className="explain-title">
        {words(explained.title)}
        {explained.value && (
          <span className="explain-value">
            <PhraseText phrase={explained.value} />
          </span>
        )}
      </h3>
      {explained.words && (
        <p>
          <PhraseText phrase={explained.words} />
        </p>
      )}
      {explained.equation && (
        <section>
          <h4 className="region-heading">Equation</h4>
          <p className="equation">{words(explained.equation)}</p>
          {explained.where && <p className="text-14 text-ink2">{words(explained.where)}</p>}
        </section>
      )}
      {explained.inputs.length > 0 && (
        <section>
          <h4 className="region-heading">What goes in</h4>
          <table className="table">
            <tbody>
              {explained.inputs.map((input, index) => (
                <InputRow key={`${input.label}:${String(index)}`} input={input} />
              ))}
            </tbody>
          </table>
        </section>
      )}
      {explained.assumptions.length > 0 && (
        <section>
          <h4 className="region-heading">Assumptions</h4>
          <ul className="word-list">
            {explained.assumptions.map((line) => (
              <li key={line}>{words(line)}</li>
            ))}
          </ul>
        </section>
      )}
      {explained.limits && (
        <section>
          <h4 className="region-heading">Limits</h4>
          <p>{words(explained.limits)}</p>
        </section>
      )}
      <section>
        <h4 className="region-heading">Source</h4>
        <p>{explained.source}</p>
      </section>
    </>
  );
}

function InputRow({ input }: { readonly input: ExplainInput }) {
  const { explain } = useExplain.getState();
  const { address } = input;
  return (
    <tr>
      <th scope="row">
        {address ? (
          <button type="button" className="link" onClick={() => explain(address, useExplain.getState().caseId ?? undefined)}>
            {input.label}
          </button>
        ) : (
          input.label
        )}
      </th>
      <td>
        <PhraseText phrase={input.value.map((part) => (typeof part === 'string' ? part : { ...part, address: undefined }))} />
      </td>
      <td className="text-ink2">{input.source}</td>
    </tr>
  );
}
