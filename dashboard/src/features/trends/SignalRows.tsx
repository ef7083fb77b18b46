import { Box, Checkbox, Table, TableBody, TableCell, TableHead, TableRow, TextField } from '@mui/material';
import { type TrendLook } from '@tailrace/shared/contracts/trends';
import { signalRoles, type SignalRole } from '@tailrace/shared/core/series';
import { roleWords } from '@tailrace/shared/messages/screens';
import { useState } from 'react';
import { Choice } from '../../ui/Choice';
import { Pages } from '../../ui/Pages';
import { choiceFor, type SignalChoice, type SignalChoices } from './signal-choice';
import { ValveChoice } from './ValveChoice';

interface SignalRowsProps {
  tags: TrendLook['tags'];
  chosen: SignalChoices;
  onChoose: (historianTag: string, choice: SignalChoice) => void;
}

/** A file may hold thousands of tags; each row has fields of its own. */
const rowsOfPage = 60;

const roles = signalRoles.map((role) => ({ value: role, word: roleWords[role] }));

/** Every tag of the file: bound already, or to be bound now, or left in the file. */
export function SignalRows({ tags, chosen, onChoose }: SignalRowsProps) {
  const [page, setPage] = useState(0);
  const shown = tags.slice(page * rowsOfPage, (page + 1) * rowsOfPage);
  return (
    <Box sx={{ overflowX: 'auto' }}>
      <Table aria-label="Tags of the file and their signals" sx={{ '& td': { verticalAlign: 'middle' } }}>
        <TableHead>
          <TableRow>
            <TableCell>Historian tag</TableCell>
            <TableCell>First values</TableCell>
            <TableCell>Valve</TableCell>
            <TableCell>Signal</TableCell>
            <TableCell>Unit</TableCell>
            <TableCell>Reversed</TableCell>
          </TableRow>
        </TableHead>
        <TableBody>
          {shown.map((tag) => {
            const choice = choiceFor(tag, chosen);
            const set = (part: Partial<SignalChoice>) => onChoose(tag.historianTag, { ...choice, ...part });
            const name = tag.historianTag;
            return (
              <TableRow key={name}>
                <TableCell sx={{ fontWeight: 500, overflowWrap: 'anywhere', minWidth: '8rem' }}>
                  {name}
                </TableCell>
                <TableCell sx={{ color: 'text.secondary' }}>{tag.examples.slice(0, 3).join('; ')}</TableCell>
                {tag.bound.length > 0 ? (
                  <TableCell colSpan={4}>
                    {tag.bound
                      .map(
                        (one) => `${one.valveTag}, ${roleWords[one.role]}${one.unit ? `, ${one.unit}` : ''}`,
                      )
                      .join('; ')}
                    <Box component="span" sx={{ color: 'text.secondary' }}>
                      {' · bound before'}
                    </Box>
                  </TableCell>
                ) : (
                  <>
                    <TableCell>
                      <ValveChoice
                        label={`Valve of ${name}`}
                        value={choice.valve}
                        onChoose={(valve) => set({ valve })}
                      />
                    </TableCell>
                    <TableCell>
                      <Choice
                        label=""
                        ariaLabel={`Signal of ${name}`}
                        none="–"
                        value={choice.role ?? undefined}
                        options={roles}
                        onChoose={(role) => set({ role: (role as SignalRole | undefined) ?? null })}
                        width={165}
                      />
                    </TableCell>
                    <TableCell>
                      <TextField
                        value={choice.unit}
                        onChange={(event) => set({ unit: event.target.value })}
                        sx={{ width: 90 }}
                        slotProps={{ htmlInput: { 'aria-label': `Unit of ${name}`, maxLength: 20 } }}
                      />
                    </TableCell>
                    <TableCell>
                      <Checkbox
                        size="small"
                        checked={choice.reversed}
                        onChange={(event) => set({ reversed: event.target.checked })}
                        slotProps={{ input: { 'aria-label': `${name} rises as the valve closes` } }}
                      />
                    </TableCell>
                  </>
                )}
              </TableRow>
            );
          })}
        </TableBody>
      </Table>
      {tags.length > rowsOfPage && (
        <Pages page={page} pageSize={rowsOfPage} total={tags.length} what="tags" onPage={setPage} />
      )}
    </Box>
  );
}
