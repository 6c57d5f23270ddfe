import { keepPreviousData, QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query';
import { useEffect, useId, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';
import { useLasting } from '#src/components/material/use-lasting.ts';
import { useSettled } from '#src/components/material/use-settled.ts';
import { Figures } from '#src/components/text/Figures.tsx';
import { Formula } from '#src/components/text/Formula.tsx';
import { formatQuantity } from '#src/lib/format.ts';
import type { MaterialListItem } from '#src/schemas/material.ts';
import type { Page } from '#src/schemas/pagination.ts';

const settleAfterMs = 120;
const mentionAfterMs = 200;
/** As many as can be read at a glance. */
const offered = 8;

/** Finds a crystal while its name is typed. Without a script it is a form that leads to the list. */
export function MaterialSearch(): ReactNode {
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <SearchField />
    </QueryClientProvider>
  );
}

function open(item: MaterialListItem): void {
  window.location.assign(`/materials/${item.slug}`);
}

async function searchMaterials(q: string, signal: AbortSignal): Promise<readonly MaterialListItem[]> {
  const query = new URLSearchParams({ q, limit: String(offered) });
  const response = await fetch(`/api/v1/materials?${query.toString()}`, { signal });
  if (!response.ok) throw new Error(`The search answered with status ${response.status}.`);
  // The contract of the same build stands behind this answer.
  return ((await response.json()) as Page<MaterialListItem>).items;
}

function SearchField(): ReactNode {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const [text, setText] = useState('');
  const [isOpen, setIsOpen] = useState(false);
  const [active, setActive] = useState<number | null>(null);
  const asked = useSettled(text.trim(), settleAfterMs);
  const query = useQuery({
    queryKey: ['search', asked],
    queryFn: ({ signal }) => searchMaterials(asked, signal),
    enabled: asked !== '',
    placeholderData: keepPreviousData,
    staleTime: 60_000,
    retry: false,
  });
  const isWaiting = useLasting(query.isFetching, mentionAfterMs);
  const items = text.trim() === '' ? [] : (query.data ?? []);
  const isListed = isOpen && items.length > 0;
  const activeItem = active === null ? undefined : items[active];

  // What was typed before the page woke up is asked at once.
  useEffect(() => {
    const typed = input.current?.value ?? '';
    if (typed !== '') {
      setText(typed);
      setIsOpen(true);
    }
  }, []);

  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      if (items.length === 0) return;
      event.preventDefault();
      setIsOpen(true);
      const last = items.length - 1;
      if (event.key === 'ArrowDown') setActive(active === null || active >= last ? 0 : active + 1);
      else setActive(active === null || active <= 0 ? last : active - 1);
    } else if (event.key === 'Escape') {
      if (isListed) event.preventDefault();
      setIsOpen(false);
      setActive(null);
    } else if (event.key === 'Enter' && isListed && activeItem !== undefined) {
      event.preventDefault();
      open(activeItem);
    }
  };

  const status = ((): string => {
    if (text.trim() === '') return '';
    if (query.isError)
      return 'The search cannot be reached at the moment. Press Enter to try the list of materials.';
    if (isWaiting) return 'searching…';
    if (asked === text.trim() && query.data?.length === 0) {
      return `Nothing is like “${asked}”. Try a formula, such as MgO, or another name.`;
    }
    return '';
  })();

  return (
    <form method="get" action="/materials" role="search">
      <label htmlFor={`${id}-q`} className="block text-margin text-soft">
        Find a crystal by name or formula; a misspelling is forgiven
      </label>
      <div className="relative mt-1 flex items-stretch">
        <input
          ref={input}
          id={`${id}-q`}
          name="q"
          type="search"
          className="field search-field min-w-0 grow"
          role="combobox"
          aria-expanded={isListed}
          aria-controls={`${id}-list`}
          aria-autocomplete="list"
          {...(isListed && active !== null ? { 'aria-activedescendant': `${id}-${active}` } : {})}
          autoComplete="off"
          autoCapitalize="off"
          spellCheck={false}
          // The front page has one purpose, and this is it.
          // eslint-disable-next-line jsx-a11y/no-autofocus
          autoFocus
          value={text}
          onChange={(event) => {
            setText(event.target.value);
            setIsOpen(true);
            setActive(null);
          }}
          onFocus={() => {
            setIsOpen(true);
          }}
          onBlur={() => {
            setIsOpen(false);
          }}
          onKeyDown={onKeyDown}
        />
        <button type="submit" className="quiet-button border-l-0 px-5">
          Search
        </button>
        <div
          id={`${id}-list`}
          role="listbox"
          aria-label="Materials found"
          className={isListed ? 'search-list' : 'hidden'}
        >
          {items.map((item, index) => (
            <div
              key={item.slug}
              id={`${id}-${index}`}
              role="option"
              aria-selected={index === active}
              tabIndex={-1}
              className={index === active ? 'search-option is-active' : 'search-option'}
              // The field keeps the focus: a press would take it and close the list before the click.
              onMouseDown={(event) => {
                event.preventDefault();
              }}
              onClick={() => {
                open(item);
              }}
              onKeyDown={onKeyDown}
            >
              <span>{item.name}</span>
              <span className="text-soft">
                <Formula formula={item.formula} />
              </span>
              <span className="search-kappa figures">
                {item.kappa_300_W_mK === null ? (
                  <span className="text-soft">κ(300{'\u2009'}K) not known</span>
                ) : (
                  <>
                    <Figures
                      text={formatQuantity(item.kappa_300_W_mK.value, {
                        significant: 3,
                        unit: 'W/(m\u2009K)',
                      })}
                    />{' '}
                    <span className={item.kappa_300_W_mK.basis === 'measured' ? 'text-ember' : 'text-tide'}>
                      {item.kappa_300_W_mK.basis}
                    </span>
                  </>
                )}
              </span>
            </div>
          ))}
        </div>
      </div>
      <p role="status" aria-live="polite" className="mt-1 min-h-[20px] text-margin text-soft">
        {status}
        {isListed && (
          <span className="sr-only">
            {items.length === 1 ? '1 material found' : `${items.length} materials found`}
          </span>
        )}
      </p>
    </form>
  );
}
