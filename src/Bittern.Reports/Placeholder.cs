namespace Bittern.Reports;
