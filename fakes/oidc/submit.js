// The app has asked already whether to sign out, so this page does not ask a second time.
document.getElementById('sign-out').click()
