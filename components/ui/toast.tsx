import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Icon } from '@/components/ui/icon';
import { type IconName } from '@/components/ui/icon-shapes';
import { Txt } from '@/components/ui/text';
import { radius } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';

export interface Toast {
  readonly text: string;
  readonly icon?: IconName;
  readonly action?: { readonly label: string; readonly onPress: () => unknown };
}

interface ToastShower {
  readonly show: (toast: Toast) => void;
}

const ToastContext = createContext<ToastShower | null>(null);

/** How long a toast stays; longer when there is something to press. */
const STAY_MS = 6_000;
const STAY_WITH_ACTION_MS = 12_000;

type Shown = Toast & { readonly id: number };

/** Short notes about what was just done, over whatever screen is there. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [toasts, setToasts] = useState<readonly Shown[]>([]);
  const lastId = useRef(0);
  const show = useCallback((toast: Toast) => {
    lastId.current += 1;
    const shown = { ...toast, id: lastId.current };
    setToasts((others) => [...others.slice(-1), shown]);
  }, []);
  const take = useCallback((id: number) => setToasts((others) => others.filter((toast) => toast.id !== id)), []);
  const shower = useMemo(() => ({ show }), [show]);
  const isWide = useLayout().kind === 'wide';
  return (
    <ToastContext value={shower}>
      {children}
      <View
        role="status"
        style={{
          position: 'absolute',
          left: 16,
          right: 16,
          bottom: isWide ? 24 : 80,
          gap: 8,
          alignItems: 'center',
          pointerEvents: 'box-none',
        }}
      >
        {toasts.map((toast) => (
          <ToastStrip key={toast.id} toast={toast} onTake={take} />
        ))}
      </View>
    </ToastContext>
  );
}

/** Shows a toast over the present screen, two at most at a time. */
export function useToast(): ToastShower {
  const shower = useContext(ToastContext);
  if (shower === null) throw new Error('useToast needs a ToastProvider above it.');
  return shower;
}

function ToastStrip({ toast, onTake }: { toast: Shown; onTake: (id: number) => void }) {
  const colours = useColours();
  const [isHeld, setIsHeld] = useState(false);
  const { id, text, icon = 'check', action } = toast;
  const stayMs = action === undefined ? STAY_MS : STAY_WITH_ACTION_MS;
  useEffect(() => {
    if (isHeld) return;
    const timer = setTimeout(() => onTake(id), stayMs);
    return () => clearTimeout(timer);
  }, [id, isHeld, onTake, stayMs]);
  const hold = { onPointerEnter: () => setIsHeld(true), onPointerLeave: () => setIsHeld(false) };
  return (
    <View
      {...hold}
      {...{ onFocus: () => setIsHeld(true), onBlur: () => setIsHeld(false) }}
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        gap: 12,
        width: '100%',
        maxWidth: 440,
        minHeight: 52,
        paddingHorizontal: 16,
        paddingVertical: 12,
        borderRadius: radius.control,
        backgroundColor: colours.ink,
      }}
    >
      <Icon name={icon} size={18} colour="paper" />
      <Txt size="row" weight="medium" colour="paper" style={{ flexGrow: 1, flexShrink: 1 }}>
        {text}
      </Txt>
      {action === undefined ? null : (
        <Button
          kind="text"
          tone="paper"
          label={action.label}
          onPress={() => {
            onTake(id);
            action.onPress();
          }}
        />
      )}
    </View>
  );
}
