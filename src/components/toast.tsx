import { Toast as RadixToast } from 'radix-ui';
import { createContext, useCallback, useContext, useState, type ReactNode } from 'react';

interface ToastAction {
  label: string;
  onClick(): void;
}

interface Message {
  id: number;
  text: string;
  action?: ToastAction;
}

type ShowToast = (text: string, action?: ToastAction) => void;

const ToastContext = createContext<ShowToast>(() => undefined);

/** Long enough to read and to undo. */
const durationMs = 8000;

/** Shows short messages at the bottom left. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [messages, setMessages] = useState<Message[]>([]);
  const show = useCallback<ShowToast>((text, action) => {
    setMessages((current) => [...current, { id: (current.at(-1)?.id ?? 0) + 1, text, action }]);
  }, []);
  const drop = (id: number): void => setMessages((current) => current.filter((message) => message.id !== id));
  return (
    <ToastContext value={show}>
      <RadixToast.Provider duration={durationMs} swipeDirection="left">
        {children}
        {messages.map(({ id, text, action }) => (
          <RadixToast.Root
            key={id}
            onOpenChange={(open) => !open && drop(id)}
            className="flex items-center justify-between gap-6 rounded-control bg-ink px-4 py-3 text-body text-white shadow-float"
          >
            <RadixToast.Description>{text}</RadixToast.Description>
            {action && (
              <RadixToast.Action
                altText={action.label}
                onClick={action.onClick}
                className="font-medium text-[#8fd0c3] focus-visible:outline-white pointer-coarse:min-h-11"
              >
                {action.label}
              </RadixToast.Action>
            )}
          </RadixToast.Root>
        ))}
        <RadixToast.Viewport className="fixed bottom-4 left-4 z-50 flex w-[min(360px,calc(100vw-2rem))] flex-col gap-2" />
      </RadixToast.Provider>
    </ToastContext>
  );
}

/** Shows a message, with an action such as Undo. */
export function useToast(): ShowToast {
  return useContext(ToastContext);
}
