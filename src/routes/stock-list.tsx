export { StockListPage as default } from '#src/features/stock/components/StockListPage.tsx';
