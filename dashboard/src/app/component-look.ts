import { type ThemeOptions } from '@mui/material/styles';

/** How the components of the library look here: flat, without shadows, edges of one line, small paddings. */
export const componentLook: ThemeOptions['components'] = {
  MuiButtonBase: { defaultProps: { disableRipple: true } },
  MuiButton: {
    defaultProps: { disableElevation: true, size: 'small' },
    styleOverrides: {
      root: {
        minWidth: 0,
        fontSize: '0.9375rem',
        '&.Mui-focusVisible': { outline: '2px solid var(--tr-water)', outlineOffset: 2 },
      },
      contained: { paddingInline: 14, paddingBlock: 5 },
      outlined: { paddingInline: 12, paddingBlock: 4 },
    },
  },
  MuiIconButton: {
    styleOverrides: {
      root: { '&.Mui-focusVisible': { outline: '2px solid var(--tr-water)', outlineOffset: -2 } },
    },
  },
  MuiPaper: {
    defaultProps: { elevation: 0 },
    styleOverrides: { root: { backgroundImage: 'none', boxShadow: 'none' } },
  },
  MuiMenu: {
    styleOverrides: { paper: { border: '1px solid var(--tr-edge)' }, list: { paddingBlock: 4 } },
  },
  MuiPopover: { styleOverrides: { paper: { border: '1px solid var(--tr-edge)' } } },
  MuiAutocomplete: { styleOverrides: { paper: { border: '1px solid var(--tr-edge)', marginTop: 2 } } },
  MuiDialog: { styleOverrides: { paper: { border: '1px solid var(--tr-edge)' } } },
  MuiTextField: { defaultProps: { size: 'small', variant: 'outlined' } },
  MuiFormControl: { defaultProps: { size: 'small' } },
  MuiFormHelperText: { styleOverrides: { root: { marginInline: 0, fontSize: '0.8125rem' } } },
  MuiFormLabel: { styleOverrides: { asterisk: { display: 'none' } } },
  MuiOutlinedInput: {
    styleOverrides: {
      root: { backgroundColor: 'var(--tr-sheet)' },
      notchedOutline: { borderColor: 'var(--tr-edge)' },
      input: { paddingBlock: 7 },
    },
  },
  MuiInputBase: {
    styleOverrides: { input: { '&::placeholder': { color: 'var(--tr-ink-2)', opacity: 1 } } },
  },
  MuiLink: { defaultProps: { underline: 'always' } },
  MuiTable: { defaultProps: { size: 'small' } },
  MuiTableCell: {
    styleOverrides: {
      root: { borderColor: 'var(--tr-line)', padding: '5px 20px 5px 0', fontSize: '0.9375rem' },
      alignRight: { paddingRight: 24, '&:last-child': { paddingRight: 0 } },
      head: {
        color: 'var(--tr-ink-2)',
        fontWeight: 500,
        fontSize: '0.8125rem',
        lineHeight: 1.35,
        borderBottomColor: 'var(--tr-edge)',
        verticalAlign: 'bottom',
      },
    },
  },
  MuiTooltip: {
    styleOverrides: {
      tooltip: { backgroundColor: 'var(--tr-ink)', color: 'var(--tr-paper)', fontSize: '0.8125rem' },
    },
  },
  MuiLinearProgress: {
    styleOverrides: { root: { height: 6, backgroundColor: 'var(--tr-band)' } },
  },
  MuiSkeleton: { defaultProps: { animation: false, variant: 'rectangular' } },
  MuiDataGrid: {
    defaultProps: { density: 'compact', disableRowSelectionOnClick: true },
    styleOverrides: {
      root: {
        border: 0,
        fontSize: '0.9375rem',
        '--DataGrid-rowBorderColor': 'var(--tr-line)',
        '& .MuiDataGrid-cell, & .MuiDataGrid-columnHeader': { borderColor: 'var(--tr-line)' },
        '& .MuiDataGrid-columnSeparator': { color: 'var(--tr-line)' },
      },
      columnHeaderTitle: { fontWeight: 500, fontSize: '0.8125rem', color: 'var(--tr-ink-2)' },
    },
  },
};
