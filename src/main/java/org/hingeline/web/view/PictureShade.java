package org.hingeline.web.view;

/**
 * What lies on either side of the limit, as outlines: along every column Ω only rises or only falls, so one edge parts them.
 *
 * @param shortOf where Ω is under the limit
 * @param beyond where it is not
 */
record PictureShade(String shortOf, String beyond) {
    static final PictureShade NONE = new PictureShade("", "");

    static PictureShade of(double[][] grid, double limit) {
        StringBuilder edge = new StringBuilder();
        int columns = grid[0].length;
        for (int column = 0; column < columns; column++) {
            edge.append(column == 0 ? 'M' : 'L')
                    .append(OmegaPicture.thousand((double) column / (columns - 1)))
                    .append(' ')
                    .append(OmegaPicture.thousand(1 - edgeOf(grid, column, limit)));
        }
        String below = edge + "L1000 1000L0 1000Z";
        String above = edge + "L1000 0L0 0Z";
        return rises(grid) ? new PictureShade(below, above) : new PictureShade(above, below);
    }

    private static boolean rises(double[][] grid) {
        int middle = grid[0].length / 2;
        return grid[grid.length - 1][middle] > grid[grid.length / 2][middle];
    }

    /** How far up the edge lies, 0 to 1. */
    private static double edgeOf(double[][] grid, int column, double limit) {
        int rows = grid.length;
        for (int row = 0; row + 1 < rows; row++) {
            double here = grid[row][column];
            double next = grid[row + 1][column];
            if (here < limit != next < limit) {
                return (row + (limit - here) / (next - here)) / (rows - 1);
            }
        }
        boolean shortAtTop = grid[rows - 1][column] < limit;
        return shortAtTop == rises(grid) ? 1 : 0;
    }
}
