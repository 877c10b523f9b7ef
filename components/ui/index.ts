/**
 * The controls of every page. Import from here or from the file; components that need the browser are marked (c).
 *
 * Actions      Button {kind: primary | secondary | quiet | destructive}, ButtonLink {kind, href}, IconButton {label} (button.tsx)
 * Fields       TextField, TextArea, SelectField {label, hint, error, labelHidden, ...native} (c), Checkbox {label, hint}, RadioGroup {legend, name, value, options, onChange},
 *              Field {label, hint, error, children(wiring)} and controlClass for a control of one's own, FormError, FormErrorSummary {faults: {fieldId, message}[]} (c)
 * Floating     Dialog, Sheet {open, onOpenChange, title, description} (c); Menu {trigger, label} with MenuItem, MenuLink, MenuCheckbox, MenuChoice, MenuLabel, MenuSeparator (c);
 *              Tooltip {text} (c, never for what is needed); useToast()({text, undo?}) (c)
 * States       Pill, PillLink {tone: done | caution | problem | neutral}, Caution {href}, Notice {tone, title, actions}, EmptyState {title, action}, Skeleton {className},
 *              Progress {label, done, total, detail, still}, timeLeft(startedAt, done, total, now)
 * Page         PageHeader {title, subtitle, actions}, SectionHeading {id, beside, actions, level: 2 | 3}, Breadcrumb {items}, Tabs {label, tabs: {href, label, count, current}[]},
 *              Pagination {page, pageSize, total, hrefOf, pageSizes}
 * Data         DefinitionList (label left, figure right), FactList (term left, words right) {items: {label, value}[]}; Table {caption} with TableHead, ColumnHead, TableBody, Cell, RowHead
 * Text         NumberText {value, as: whole | decimal | share, digits, unit}, DateText {at, withTime} (c), RelativeTime {at} (c), KeyHint, VisuallyHidden, Icon {name, size},
 *              ClusterSwatch {index, letter, name, uncertain}, clusterLetter(index), clusterDye(index); formatNumber, formatDecimal, formatShare, formatBytes, count
 * Hooks        useKeys({key: act}, enabled) (c), useAddress() (c)
 *
 * Frame        components/frame: Header {person, signOut}, MainRow {items}, SectionRow {label, items}, Place {items}, SheetWithEvidence {evidence, aside, bare},
 *              usePageKeys(title, lines) (c), useScheme(), useShownScheme() (c), Brand, Mark
 * Evidence     components/evidence: EvidencePanel {panelKey, title, subject, facts, loading, problem, onRetry, onClose} (c); evidence-parts: EvidenceSection, EvidenceRows, FileLines,
 *              EvidenceMethod, EvidenceCoverage, EvidenceCaution
 * Tables       components/tables: DataTable {caption, columns, rows, rowKey, sort, onSort, selectedKey, onOpen, loading, empty, name, filters, actions} (c),
 *              useAddressState({sort, pageSize, filters}) (c), FilterField {label, value, onChange} (c)
 * Charts       components/charts: YearBars {values, title, unit, compact, tone}, IntervalBar {value, low, high, from, to, scale, label}, DistributionStrip {bins, title, axis, mark},
 *              TableTwin {caption, heads, rows}
 */
export { Breadcrumb, type Crumb } from '@/components/ui/breadcrumb';
export { Button, ButtonLink, IconButton, type ButtonKind } from '@/components/ui/button';
export { clusterDye, clusterLetter, ClusterSwatch } from '@/components/ui/cluster-swatch';
export { DateText, formatAgo, formatDate, RelativeTime } from '@/components/ui/date-text';
export { DefinitionList, FactList, type Definition } from '@/components/ui/definition-list';
export { Dialog, Sheet } from '@/components/ui/dialog';
export { Checkbox, controlClass, Field, FormError, RadioGroup, SelectField, TextArea, TextField } from '@/components/ui/field';
export { FormErrorSummary, type FieldFault } from '@/components/ui/form-errors';
export { Icon, type IconName } from '@/components/ui/icons';
export { KeyHint } from '@/components/ui/key-hint';
export { Menu, MenuCheckbox, MenuChoice, MenuItem, MenuLabel, MenuLink, MenuSeparator } from '@/components/ui/menu';
export { NumberText } from '@/components/ui/number-text';
export { count, formatBytes, formatDecimal, formatNumber, formatShare } from '@/components/ui/numbers';
export { PageHeader, SectionHeading } from '@/components/ui/page-header';
export { Pagination } from '@/components/ui/pagination';
export { Progress, timeLeft } from '@/components/ui/progress';
export { Caution, EmptyState, Notice, Pill, PillLink, Skeleton, type Tone } from '@/components/ui/status';
export { Cell, ColumnHead, RowHead, Table, TableBody, TableHead } from '@/components/ui/table';
export { Tabs, type TabLink } from '@/components/ui/tabs';
export { ToastProvider, useToast } from '@/components/ui/toast';
export { Tooltip } from '@/components/ui/tooltip';
export { changedQuery, useAddress } from '@/components/ui/use-address';
export { useKeys } from '@/components/ui/use-keys';
export { VisuallyHidden } from '@/components/ui/visually-hidden';
