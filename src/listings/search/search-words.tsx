// The words or the code of the question, in a field over the list.
import { Search } from 'lucide-react';
import { useState } from 'react';
import { Button } from '../../ui/button';
import { TextInput } from '../../ui/form/text-input';
import type { UnitQuery } from './search-url';

interface SearchWordsProps {
  readonly query: UnitQuery;
  readonly onAsk: (query: UnitQuery) => void;
}

function Words({ query, onAsk }: SearchWordsProps) {
  const [text, setText] = useState(query.q ?? '');
  return (
    <form
      className="search-words"
      role="search"
      onSubmit={(event) => {
        event.preventDefault();
        onAsk({ ...query, q: text.trim() || undefined });
      }}
    >
      <TextInput
        label="Case code or unit"
        type="search"
        maxLength={200}
        value={text}
        onChange={(event) => setText(event.target.value)}
      />
      <Button type="submit" icon={Search}>
        Find
      </Button>
    </form>
  );
}

export const SearchWords = (props: SearchWordsProps) => <Words key={props.query.q ?? ''} {...props} />;
