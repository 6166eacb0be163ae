
<!DOCTYPE html>
<html><title>Sign in</title></html>
