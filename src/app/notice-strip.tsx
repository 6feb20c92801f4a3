import { Icon } from '#src/components/icons.tsx';
import { useKeeping } from '#src/stores/keeping-store.ts';

/** One strip above the sheet for what a person must know about the circuit in hand; never a blocking dialog. */
export function NoticeStrip() {
  const notice = useKeeping((state) => state.notice);
  const cure = useKeeping((state) => state.cure);
  const setNotice = useKeeping((state) => state.setNotice);
  const keeping = useKeeping((state) => state.keeping);
  const takeOver = useKeeping((state) => state.takeOver);
  const openOther = useKeeping((state) => state.openOther);
  return (
    <>
      {keeping === 'other-tab' && takeOver && (
        <div className="notice-strip no-print" role="status">
          {openOther ? (
            <p>
              <strong>Two tabs changed this circuit.</strong> The other one’s is kept on this device; what stands here is not.
            </p>
          ) : (
            <p>
              <strong>Open in another tab.</strong> That tab keeps the circuit of this device; what you change here is not kept.
            </p>
          )}
          {openOther && (
            <button type="button" className="button" onClick={openOther}>
              Open the kept one
            </button>
          )}
          <button type="button" className="button" onClick={takeOver}>
            Keep this one instead
          </button>
        </div>
      )}
      {notice && (
        <div className="notice-strip no-print" role="status">
          <p>{notice}</p>
          {cure && (
            <button type="button" className="button" onClick={cure.act}>
              {cure.label}
            </button>
          )}
          <button type="button" className="button-icon" aria-label="Put the notice away" onClick={() => setNotice(null)}>
            <Icon name="close" size={16} />
          </button>
        </div>
      )}
    </>
  );
}
