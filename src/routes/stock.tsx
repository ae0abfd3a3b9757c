export { StockPage as default } from '#src/features/stock/components/StockPage.tsx';
