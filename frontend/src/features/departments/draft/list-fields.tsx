import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';

export interface ListFieldsProps<Item> {
  items: readonly Item[];
  onChange: (items: Item[]) => void;
  /** A new item, as it begins. */
  fresh: () => Item;
  addWord: string;
  /** What an item is called: "Window 2". */
  nameOf: (index: number) => string;
  /** The fewest there may be. */
  fewest?: number;
  children: (item: Item, index: number, change: (next: Item) => void) => ReactNode;
}

/** A list of parts that are typed one by one: each in its box with the act that takes it out, and one act to add. */
export function ListFields<Item>(props: ListFieldsProps<Item>): ReactNode {
  const { items, onChange, fresh, addWord, nameOf, fewest = 0, children } = props;
  const { t } = useTranslation('departments');
  return (
    <div className="list-fields">
      {items.map((item, index) => (
        <fieldset key={index} className="item-fields">
          <legend className="h3">{nameOf(index)}</legend>
          {children(item, index, (next) => onChange(items.with(index, next)))}
          {items.length > fewest ? (
            <Act
              kind="text"
              size="sm"
              aria-label={t('form.takeOutNamed', { what: nameOf(index) })}
              onClick={() => onChange(items.filter((_, at) => at !== index))}
            >
              {t('form.takeOut')}
            </Act>
          ) : null}
        </fieldset>
      ))}
      <div>
        <Act size="sm" icon="plus" onClick={() => onChange([...items, fresh()])}>
          {addWord}
        </Act>
      </div>
    </div>
  );
}
