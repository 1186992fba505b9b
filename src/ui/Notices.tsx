import { createContext, use, useCallback, useEffect, useMemo, useRef, useState } from "react";
import { StateMark, type State } from "./StateMark";
import { TextButton } from "./TextButton";

export interface Notice {
  text: string;
  state?: State;
  /** What can still be done about it: "Put back". */
  action?: { label: string; run: () => void };
}

interface ShownNotice extends Notice {
  id: number;
}

type Notify = (notice: Notice) => void;

/** How long a notice stays unless it is pointed at or holds the focus, in ms. */
const lifetime = 9000;

const NoticesContext = createContext<Notify | null>(null);

/** Tells the person what has just happened, in a sentence that goes away by itself. */
export function useNotify(): Notify {
  const notify = use(NoticesContext);
  if (!notify) throw new Error("useNotify needs NoticesProvider above it.");
  return notify;
}

/** Holds the notices at the foot of the window. Later ones stand below; four at most. */
export function NoticesProvider({ children }: { children: React.ReactNode }) {
  const [notices, setNotices] = useState<ShownNotice[]>([]);
  const nextId = useRef(0);

  const dismiss = useCallback(
    (id: number) => setNotices((shown) => shown.filter((notice) => notice.id !== id)),
    [],
  );
  const notify = useCallback<Notify>((notice) => {
    const id = nextId.current++;
    setNotices((shown) => [...shown.slice(-3), { ...notice, id }]);
  }, []);

  return (
    <NoticesContext value={notify}>
      {children}
      <div
        role="status"
        aria-live="polite"
        data-print="never"
        className="pointer-events-none fixed right-18 bottom-18 left-18 z-50 flex flex-col items-end gap-8"
      >
        {notices.map((notice) => (
          <NoticeLine key={notice.id} notice={notice} onDismiss={dismiss} />
        ))}
      </div>
    </NoticesContext>
  );
}

function NoticeLine({ notice, onDismiss }: { notice: ShownNotice; onDismiss: (id: number) => void }) {
  const [isHeld, setHeld] = useState(false);
  const hold = useMemo(
    () => ({
      onPointerEnter: () => setHeld(true),
      onPointerLeave: () => setHeld(false),
      onFocus: () => setHeld(true),
      onBlur: () => setHeld(false),
    }),
    [],
  );

  useEffect(
    function goAfterAWhile() {
      if (isHeld) return;
      const timer = window.setTimeout(() => onDismiss(notice.id), lifetime);
      return () => window.clearTimeout(timer);
    },
    [isHeld, notice.id, onDismiss],
  );

  return (
    <div
      {...hold}
      className="pointer-events-auto flex max-w-[440px] items-baseline gap-12 rounded border border-rule2 bg-raised px-18 py-10 font-sans text-[14.5px]/[22px] text-ink shadow-float"
    >
      {notice.state && <StateMark state={notice.state} className="translate-y-1" />}
      <span className="min-w-0 flex-1">{notice.text}</span>
      {notice.action && (
        <TextButton
          className="font-semibold"
          onClick={() => {
            notice.action?.run();
            onDismiss(notice.id);
          }}
        >
          {notice.action.label}
        </TextButton>
      )}
      <TextButton
        className="text-ink3"
        onClick={() => onDismiss(notice.id)}
        aria-label={`Put away: ${notice.text}`}
      >
        close
      </TextButton>
    </div>
  );
}
