package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

class NameRowsTest {

    @Test
    void theFirstRowOfANameIsKept() {
        NameRows names = new NameRows();
        for (int row = 1; row <= 20_000; row++) {
            assertEquals(row, names.firstRow("object " + row, row));
        }
        for (int row = 1; row <= 20_000; row++) {
            assertEquals(row, names.firstRow("object " + row, 30_000 + row));
        }
    }
}
